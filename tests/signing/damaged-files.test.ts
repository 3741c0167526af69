import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Bytes } from '@/lib/signing/bytes';
import { verifyPdf } from '@/lib/signing/verify-pdf';
import { ines, keyOf, makeBase, type Office, openOffice, seal, tomas } from './office';
import { lastCms, lastHole } from './tamper';

let office: Office;
let files: Bytes[];
beforeAll(async () => {
  office = await openOffice();
  const once = await seal(office, await makeBase(), ines, await keyOf(office, ines));
  files = [once, await seal(office, once, tomas, await keyOf(office, tomas), 'second-engineer')];
});
afterAll(() => office.stamps.close());

/** Marsaglia's xorshift32: the same damage at every run. */
function makeRandom(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) % below;
  };
}

/** Anywhere, or in the third of the cases outside the long row of zeros that pads a signature, or in the signature. */
function anywhere(file: Bytes, random: (below: number) => number): number {
  const { from, to } = lastHole(file);
  const choice = random(3);
  if (choice === 0) return random(file.length);
  if (choice === 1) return from + 1 + random(lastCms(file).length * 2);
  const at = random(file.length - (to - from));
  return at < from ? at : at + (to - from);
}

/** Bits turned, digits exchanged, bytes replaced, cut out, put in, doubled, or the end cut off. */
function damage(file: Bytes, random: (below: number) => number): Bytes {
  const at = anywhere(file, random);
  const length = 1 + random(random(4) === 0 ? 2000 : 8);
  const noise = Uint8Array.from({ length }, () => random(256));
  const join = (...parts: Uint8Array[]) => new Uint8Array(Buffer.concat(parts));
  const put = (byte: number) => join(file.subarray(0, at), new Uint8Array([byte]), file.subarray(at + 1));
  switch (random(8)) {
    case 0:
      return file.slice(0, at);
    case 1:
      return join(file.subarray(0, at), noise, file.subarray(at + length));
    case 2:
      return join(file.subarray(0, at), file.subarray(at + length));
    case 3:
      return join(file.subarray(0, at), noise, file.subarray(at));
    case 4:
      return join(file.subarray(0, at + length), file.subarray(at));
    case 5:
      return put((file[at] as number) ^ (1 << random(8)));
    default:
      return put('0123456789abcdef'.charCodeAt(random(16)));
  }
}

it('calls none of 1,000 damaged files intact, and fails on none', { timeout: 60_000 }, async () => {
  const random = makeRandom(20417);
  const outcomes = new Map<string, number>();
  for (let n = 0; n < 1000; ) {
    const file = files[n % 2] as Bytes;
    const damaged = damage(file, random);
    if (Buffer.compare(damaged, file) === 0) continue;
    n++;
    const report = await verifyPdf(damaged, { trust: office.trust });
    expect(report.intact, `damage ${n}`).toBe(false);
    expect(report.fault, `damage ${n}`).toBeUndefined();
    const code = report.reasons[0]?.code ?? 'none';
    outcomes.set(code, (outcomes.get(code) ?? 0) + 1);
  }
  // The damage reaches the frame of the file, what is signed, and the signature.
  for (const code of [
    'not-understood',
    'byte-range',
    'content-changed',
    'not-a-signature',
    'certificate-exchanged',
  ]) {
    expect(outcomes.get(code), code).toBeGreaterThan(10);
  }
});
