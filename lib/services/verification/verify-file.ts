// server only
import { log } from '@/lib/log';
import type { FileReport } from '@/lib/signing/file-report';
import { readAttachment } from '@/lib/signing/read-attachment';
import { verifyPdf } from '@/lib/signing/verify-pdf';
import { allowAttempt } from '../limit-attempts';
import { trust } from '../trust';
import { type EmbeddedPackage, embeddedPackage, packageFileName } from './embedded-package';
import { type SheetProof, solveAgain } from './solve-again';

export const mostBytes = 48 * 1024 * 1024;
const perQuarterHour = 30;

export interface Verified {
  bytes: number;
  report: Omit<FileReport, 'fault'>;
  /** No authority is trusted here, so no signature can hold. */
  noTrust: boolean;
  contents:
    | { ours: false; why: string }
    | { ours: true; job: EmbeddedPackage['job']; submittal: number; sheets: SheetProof[] };
}

let before: Promise<unknown> = Promise.resolve();

/**
 * What a stranger can learn of a file: its signatures, what was done to it since, and whether the inputs inside it give
 * the results inside it. Only the file speaks; nothing of any office is read or kept. One file at a time, and between
 * sheets other requests get their turn. Answers undefined when one address asks too often.
 */
export async function verifyFile(bytes: Uint8Array, from: string): Promise<Verified | undefined> {
  if (!(await allowAttempt(`verify:${from}`, perQuarterHour))) return undefined;
  const turn = before.then(() => verify(bytes));
  before = turn.catch(() => undefined);
  return turn;
}

async function verify(bytes: Uint8Array): Promise<Verified> {
  const trusted = trust();
  const anchors = trusted ?? { anchors: [], stampAnchors: [] };
  const { fault, ...report } = await verifyPdf(bytes, { trust: anchors, expected: { stamped: false } });
  if (fault) log.error({ err: fault, sha256: report.sha256 }, 'a file could not be verified');
  return { bytes: bytes.length, report, noTrust: trusted === undefined, contents: await readContents(bytes) };
}

async function readContents(bytes: Uint8Array): Promise<Verified['contents']> {
  const found = readPackage(bytes);
  if (typeof found === 'string') return { ours: false, why: found };
  const sheets: SheetProof[] = [];
  for (const sheet of found.sheets) {
    sheets.push(solveAgain(sheet));
    await new Promise((resolve) => setImmediate(resolve));
  }
  return { ours: true, job: found.job, submittal: found.submittal, sheets };
}

/** The package inside a file, or a sentence saying why there is none. */
function readPackage(bytes: Uint8Array): EmbeddedPackage | string {
  let attached: Buffer | undefined;
  try {
    attached = readAttachment(bytes, packageFileName);
  } catch (error) {
    log.info({ err: error }, 'the contents of a file could not be read');
    return 'What it carries could not be read: it is damaged, encrypted, or of another kind.';
  }
  if (!attached) return 'It carries no inputs and results of ours.';
  try {
    return embeddedPackage.parse(JSON.parse(attached.toString('utf8')));
  } catch (error) {
    log.info({ err: error }, 'the data of a file is of another form');
    return 'It carries data under our name that is not in our form.';
  }
}
