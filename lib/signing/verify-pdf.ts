// server only
import { createHash } from 'node:crypto';
import { checkSignature, type Trust } from './check-signature';
import { explainUpdate } from './explain-update';
import { type FileReason, type FileReport, fileReason, type SignerReport } from './file-report';
import type { PdfChange } from './pdf-change';
import { PdfDocument } from './pdf-document';
import { NotUnderstood } from './pdf-scanner';
import { type PdfFile, readPdf } from './read-pdf';
import { readSignatureFields, type SignatureField } from './read-signature-fields';
import { readSignatureHole } from './read-signature-hole';
import { SignatureRefusal } from './signature-refusal';

/** What the office knows of a file it issued. */
export interface ExpectedFile {
  /** SHA-256 of the file as issued, in hexadecimal. */
  readonly sha256?: string;
  /** Fields that were signed when it was issued. */
  readonly fields?: readonly string[];
  /** Whether every signature must carry a time stamp; true unless said otherwise. */
  readonly stamped?: boolean;
}

export interface VerifyOptions {
  readonly trust: Trust;
  readonly expected?: ExpectedFile;
  readonly now?: Date;
}

interface Signing {
  readonly revision: number;
  readonly field: SignatureField;
}

/** Every signing in the file, oldest first, and all that was done to it after the first. */
function walkRevisions(file: PdfFile): { signings: Signing[]; changes: PdfChange[]; open: string[] } {
  const signings: Signing[] = [];
  const changes: PdfChange[] = [];
  let fields: SignatureField[] = [];
  for (const revision of file.revisions.keys()) {
    fields = readSignatureFields(new PdfDocument(file, revision));
    if (signings.length > 0) {
      const update = explainUpdate(file, revision);
      changes.push(...update.changes);
      if (update.field) signings.push({ revision, field: update.field });
      continue;
    }
    // The first signature covers its own revision and all before it.
    const [field, ...more] = fields.filter(({ signed }) => signed);
    if (more.length > 0) throw new NotUnderstood('several fields signed at once');
    if (field) signings.push({ revision, field });
  }
  if (fields.filter(({ signed }) => signed).length !== signings.length) {
    throw new NotUnderstood('a signed field without a revision of its own');
  }
  return { signings, changes, open: fields.flatMap(({ name, signed }) => (signed ? [] : [name])) };
}

async function checkSigning(
  file: PdfFile,
  { revision, field }: Signing,
  { trust, expected, now = new Date() }: VerifyOptions,
): Promise<SignerReport> {
  const found = readSignatureHole(new PdfDocument(file, revision), field);
  if (found.kind !== 'ETSI.CAdES.detached') throw new SignatureRefusal('not-a-signature', found.kind);
  const checked = await checkSignature(found.cms, found.content, trust, now);
  if (!checked.stamp && expected?.stamped !== false) throw new SignatureRefusal('time-stamp-missing');
  const end = found.content.length + found.hole.to - found.hole.from;
  const coversWholeFile = end === file.bytes.length;
  return {
    ...checked,
    field: field.name,
    coversWholeFile,
    ...(found.reason ? { reason: found.reason } : {}),
  };
}

function refusalReason(cause: unknown, field: string): FileReason {
  if (!(cause instanceof SignatureRefusal)) throw cause;
  const { code, message: sentence, detail } = cause;
  return { code, sentence, field, ...(detail ? { detail } : {}) };
}

async function verify(pdf: Uint8Array, options: VerifyOptions, sha256: string): Promise<FileReport> {
  const file = readPdf(pdf);
  const { signings, changes, open } = walkRevisions(file);
  const { expected } = options;
  const reasons: FileReason[] = [];
  const signers: SignerReport[] = [];
  for (const signing of signings) {
    try {
      signers.push(await checkSigning(file, signing, options));
    } catch (cause) {
      reasons.push(refusalReason(cause, signing.field.name));
    }
  }
  if (signings.length === 0) reasons.push(fileReason('not-signed'));
  if (changes.length > 0) reasons.push(fileReason('changed-after-signing'));
  for (const field of expected?.fields ?? []) {
    const there = signings.some((signing) => signing.field.name === field);
    if (!there) reasons.push(fileReason('signature-missing', { field }));
  }
  return {
    intact: reasons.length === 0,
    sha256,
    signers,
    stamps: signers.flatMap(({ stamp }) => stamp ?? []),
    changes,
    reasons,
    openFields: open,
  };
}

/**
 * Says whether a signed PDF is what was signed, by whom, when, and what was done to it since. Signatures are judged by the
 * given trust alone; whatever is not understood is held against the file. Never throws.
 */
export async function verifyPdf(pdf: Uint8Array, options: VerifyOptions): Promise<FileReport> {
  const sha256 = createHash('sha256').update(pdf).digest('hex');
  const nothing = { sha256, signers: [], stamps: [], changes: [], openFields: [] };
  const issued = options.expected?.sha256;
  const other = issued !== undefined && issued !== sha256 ? [fileReason('not-the-issued-file')] : [];
  try {
    const report = await verify(pdf, options, sha256);
    return { ...report, intact: report.intact && other.length === 0, reasons: [...other, ...report.reasons] };
  } catch (cause) {
    const foreseen = cause instanceof NotUnderstood;
    const detail = cause instanceof Error ? cause.message : String(cause);
    const reasons = [...other, fileReason('not-understood', { detail })];
    return { ...nothing, intact: false, reasons, ...(foreseen ? {} : { fault: cause }) };
  }
}
