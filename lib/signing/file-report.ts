import type { TimeStamp } from './check-time-stamp';
import type { PdfChange } from './pdf-change';
import type { SignatureCode } from './signature-refusal';
import type { CertificateFacts } from './signer';

const sentences = {
  'not-understood': 'The file is damaged, or of a kind that cannot be verified here.',
  'not-signed': 'The file carries no signature.',
  'changed-after-signing': 'The file was changed after it was signed.',
  'signature-missing': 'A signature this file was issued with is not in it: it was cut back or exchanged.',
  'not-the-issued-file': 'The file is not byte for byte the one that was issued.',
} as const;

export type FileReasonCode = keyof typeof sentences | SignatureCode;

/** Why a file is not called intact. */
export interface FileReason {
  readonly code: FileReasonCode;
  readonly sentence: string;
  /** The signature field it is about. */
  readonly field?: string;
  readonly detail?: string;
}

export interface SignerReport extends CertificateFacts {
  readonly field: string;
  readonly reason?: string;
  readonly stamp?: TimeStamp;
  /** Nothing follows what this signature covers. */
  readonly coversWholeFile: boolean;
}

/** What verification found. `intact` only when there is at least one signature and no reason against. */
export interface FileReport {
  readonly intact: boolean;
  /** Of the file as given, in hexadecimal. */
  readonly sha256: string;
  /** Signatures that hold, oldest first. One that does not hold is among the reasons instead. */
  readonly signers: readonly SignerReport[];
  /** The time stamps of those signatures. */
  readonly stamps: readonly TimeStamp[];
  /** What was done to the file after its first signature, beside further signatures. */
  readonly changes: readonly PdfChange[];
  readonly reasons: readonly FileReason[];
  /** Placed fields nobody has signed yet. */
  readonly openFields: readonly string[];
  /** An error nobody foresaw, for the log; the file then is never intact. */
  readonly fault?: unknown;
}

export function fileReason(code: keyof typeof sentences, more: Partial<FileReason> = {}): FileReason {
  return { ...more, code, sentence: sentences[code] };
}
