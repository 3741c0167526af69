import { PDFDocument, StandardFonts } from '@cantoo/pdf-lib';
import { buildCms } from '@/lib/signing/build-cms';
import type { Bytes } from '@/lib/signing/bytes';
import type { Person } from '@/lib/signing/check-cms';
import type { Trust } from '@/lib/signing/check-signature';
import { completeSignature } from '@/lib/signing/complete-signature';
import { type DemoAuthority, type DemoEngineer, makeDemoAuthority } from '@/lib/signing/demo-authority';
import { type LocalTimeStampServer, startLocalTimeStampServer } from '@/lib/signing/local-time-stamp-server';
import { openKeyFile } from '@/lib/signing/open-key-file';
import { type FieldPlace, placeSignatureFields } from '@/lib/signing/place-signature-fields';
import { type PreparedFile, prepareSignature } from '@/lib/signing/prepare-signature';
import { signedPart } from '@/lib/signing/signed-part';
import type { Signer } from '@/lib/signing/signer';

/** An invented office with its authority, its engineers and a time-stamping service of its own, for these tests. */
export interface Office {
  readonly authority: DemoAuthority;
  readonly trust: Trust;
  readonly stamps: LocalTimeStampServer;
}

export const ines: Person = { name: 'Ines Ørnsund', licenceNumber: 'OR-20417' };
export const tomas: Person = { name: 'Tomas Varley', licenceNumber: 'OR-18802' };

export const places: readonly FieldPlace[] = [
  { field: 'engineer-of-record', page: 0, box: [400, 80, 144, 144], label: 'Seal of the engineer of record' },
  { field: 'second-engineer', page: 1, box: [400, 80, 144, 144], label: 'Seal of the second engineer' },
];

export async function openOffice(): Promise<Office> {
  const authority = await makeDemoAuthority();
  const stamps = await startLocalTimeStampServer(await authority.issueTimeStamper());
  return {
    authority,
    stamps,
    trust: { anchors: [authority.certificate], stampAnchors: [authority.certificate] },
  };
}

export async function keyOf(office: Office, who: DemoEngineer): Promise<Signer> {
  const { file } = await office.authority.issueKeyFile({ key: 'P-256', ...who }, 'a password');
  return openKeyFile(file, 'a password');
}

/** Two pages written by pdf-lib, with the two fields placed. */
export async function makeBase(): Promise<Bytes> {
  const document = await PDFDocument.create();
  const font = await document.embedFont(StandardFonts.Helvetica);
  for (const words of ['S-01 Roof purlin, two spans', 'S-02 Quay beam, three spans']) {
    document.addPage([612, 792]).drawText(words, { x: 72, y: 700, size: 14, font });
  }
  return placeSignatureFields(await document.save({ useObjectStreams: false }), places);
}

export function prepare(
  pdf: Uint8Array,
  person: Person,
  field = 'engineer-of-record',
): Promise<PreparedFile> {
  const appearance = () => '0.7059 0.1373 0.1059 RG 2 w 10 10 120 120 re S';
  return prepareSignature(pdf, {
    field,
    name: person.name,
    reason: 'Engineer of record',
    date: new Date('2026-11-19T09:12:00Z'),
    appearance,
  });
}

export async function sign({ bytes, hole }: PreparedFile, signer: Signer): Promise<Bytes> {
  return buildCms(new Uint8Array(await crypto.subtle.digest(signer.hash, signedPart(bytes, hole))), signer);
}

/** The whole way, from an empty field to a sealed file. */
export async function seal(
  office: Office,
  pdf: Uint8Array,
  person: Person,
  signer: Signer,
  field?: string,
): Promise<Bytes> {
  const prepared = await prepare(pdf, person, field);
  const { trust, stamps } = office;
  const cms = await sign(prepared, signer);
  return (await completeSignature(prepared, cms, person, { trust, timeStampUrl: stamps.url })).pdf;
}
