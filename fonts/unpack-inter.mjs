// Unpacks Inter from fontsource-inter's WOFF files to the TrueType files beside this script.
// Run once after fontsource-inter changes: node fonts/unpack-inter.mjs
//
// WOFF 1.0 is a TrueType file whose tables are deflated one by one (W3C, WOFF File Format 1.0, §3–5). The PDF library
// would inflate a table anew at every access; a plain TrueType file makes small documents 20 to 50 times faster.
import { readFileSync, writeFileSync } from 'node:fs';
import { inflateSync } from 'node:zlib';

const WOFF_SIGNATURE = 0x774f4646;
const WOFF_HEADER = 44;
const WOFF_ENTRY = 20;
const SFNT_HEADER = 12;
const SFNT_ENTRY = 16;

const padded = (length) => Math.ceil(length / 4) * 4;

/** The tables of a WOFF file, inflated, in the order of their tags. */
function readTables(woff) {
  if (woff.readUInt32BE(0) !== WOFF_SIGNATURE) throw new Error('not a WOFF 1.0 file');
  return Array.from({ length: woff.readUInt16BE(12) }, (_, index) => {
    const entry = WOFF_HEADER + index * WOFF_ENTRY;
    const offset = woff.readUInt32BE(entry + 4);
    const packed = woff.readUInt32BE(entry + 8);
    const length = woff.readUInt32BE(entry + 12);
    const bytes = woff.subarray(offset, offset + packed);
    return {
      tag: woff.subarray(entry, entry + 4),
      checksum: woff.readUInt32BE(entry + 16),
      data: packed < length ? inflateSync(bytes) : bytes,
    };
  });
}

/** A TrueType file of these tables (OpenType 1.9, "Organization of an OpenType font"). */
function writeSfnt(flavour, tables) {
  const selector = Math.floor(Math.log2(tables.length));
  const start = SFNT_HEADER + tables.length * SFNT_ENTRY;
  const size = tables.reduce((sum, table) => sum + padded(table.data.length), start);
  const out = Buffer.alloc(size);
  out.writeUInt32BE(flavour, 0);
  out.writeUInt16BE(tables.length, 4);
  out.writeUInt16BE(2 ** selector * 16, 6);
  out.writeUInt16BE(selector, 8);
  out.writeUInt16BE((tables.length - 2 ** selector) * 16, 10);
  let offset = start;
  tables.forEach((table, index) => {
    const entry = SFNT_HEADER + index * SFNT_ENTRY;
    table.tag.copy(out, entry);
    out.writeUInt32BE(table.checksum, entry + 4);
    out.writeUInt32BE(offset, entry + 8);
    out.writeUInt32BE(table.data.length, entry + 12);
    table.data.copy(out, offset);
    offset += padded(table.data.length);
  });
  return out;
}

for (const weight of [400, 500, 600]) {
  const source = new URL(`../node_modules/fontsource-inter/files/inter-all-${weight}-normal.woff`, import.meta.url);
  const woff = readFileSync(source);
  const target = new URL(`./inter-${weight}.ttf`, import.meta.url);
  writeFileSync(target, writeSfnt(woff.readUInt32BE(4), readTables(woff)));
}
