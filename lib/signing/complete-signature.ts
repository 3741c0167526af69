// server only
import type { Bytes } from './bytes';
import { checkCms, type Person } from './check-cms';
import type { Trust } from './check-signature';
import type { FileReport } from './file-report';
import { insertSignature } from './insert-signature';
import type { PreparedFile } from './prepare-signature';
import { signedPart } from './signed-part';
import { stampSignature } from './time-stamp';
import { verifyPdf } from './verify-pdf';

export interface SealingOffice {
  readonly trust: Trust;
  /** Address of the RFC 3161 time-stamping service; without one the signature carries no stamp. */
  readonly timeStampUrl?: string | undefined;
  /** Fields that must be signed in the finished file. */
  readonly fields?: readonly string[];
  readonly now?: () => Date;
}

/** A finished file that does not verify; it is never handed out. */
export class NotIntact extends Error {
  constructor(readonly report: FileReport) {
    super('the sealed file does not verify');
  }
}

export interface SealedFile {
  readonly pdf: Bytes;
  /** Intact; its `sha256` and its signers' fields are what to expect of the file from now on. */
  readonly report: FileReport;
}

/**
 * Makes a sealed file of a prepared one and the signature a browser sent for it: checks the signature and its person,
 * has it stamped, inserts it, and verifies the whole file as a stranger would. Throws SignatureRefusal, or NotIntact:
 * nothing is returned that does not verify. The caller makes sure that the file it was prepared from is still the current one.
 */
export async function completeSignature(
  prepared: Pick<PreparedFile, 'bytes' | 'hole'>,
  cms: Bytes,
  person: Person,
  { trust, timeStampUrl, fields, now = () => new Date() }: SealingOffice,
): Promise<SealedFile> {
  await checkCms(cms, signedPart(prepared.bytes, prepared.hole), person, trust, now());
  const stamped = timeStampUrl
    ? await stampSignature(cms, { url: timeStampUrl, anchors: trust.stampAnchors }, now)
    : undefined;
  const pdf = insertSignature(prepared, stamped ? stamped.cms : cms);
  const expected = { stamped: timeStampUrl !== undefined, ...(fields ? { fields } : {}) };
  const report = await verifyPdf(pdf, { trust, expected, now: now() });
  if (!report.intact || !report.signers.at(-1)?.coversWholeFile) throw new NotIntact(report);
  return { pdf, report };
}
