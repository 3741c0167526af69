import { execFileSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { answerMark } from '@/lib/services/answer-mark';
import { concludeCheck } from '@/lib/services/conclude-check';
import { markLine } from '@/lib/services/mark-line';
import { openCheck } from '@/lib/services/open-check';
import { printCertificate } from '@/lib/services/print-certificate';
import { readSubmittalFile } from '@/lib/services/read-file';
import { sendToCheck } from '@/lib/services/send-to-check';
import { settleMark } from '@/lib/services/settle-mark';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { frozenSheet } from './sheet-factory';
import { draftedSubmittal } from './submittal-factory';

let office: Office;
let jobId: string;
let revisionId: string;
let checkId: string;

/** A check with a query answered and accepted, one line agreed and one input held. */
beforeAll(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
  ({ revisionId } = await frozenSheet(office, jobId));
  const { engineer, checker } = office.people;
  const sent = await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 });
  ({ checkId } = need(sent));
  need(await markLine(checker, { checkId, line: '1.1', kind: 'agrees', text: '' }));
  need(await markLine(checker, { checkId, line: '2.1', kind: 'query', text: 'Which drawing is it?' }));
  const held = { checkId, place: 'input', line: 'span 1', kind: 'agrees', text: '', drawing: 'A-201 rev 3' };
  need(await markLine(checker, held));
  const mark = (await openCheck(checker, checkId)).marks.find((m) => m.kind === 'query');
  const markId = mark?.id as string;
  need(await answerMark(engineer, { markId, answer: 'Drawing A-201.' }));
  need(await settleMark(checker, { markId, outcome: 'accepted' }));
}, 60_000);
afterAll(() => database().destroy());

function textOf(bytes: Uint8Array): string {
  const path = join(mkdtempSync(join(tmpdir(), 'fairhand-certificate-')), 'check.pdf');
  writeFileSync(path, bytes);
  return execFileSync('pdftotext', ['-layout', path, '-'], { encoding: 'utf8' }).replace(/\s+/g, ' ');
}

const schedule = [
  'Which drawing is it?',
  'Answered by EG',
  'Drawing A-201.',
  'Accepted by CK',
  'A-201 rev 3',
];

describe('the certificate of a check', () => {
  it('is a preliminary schedule while the check is open', async () => {
    const { bytes } = await printCertificate(office.people.engineer, checkId);
    const text = textOf(bytes);
    expect(text).toContain('in checking');
    expect(text).toContain('preliminary');
    for (const part of schedule) expect(text).toContain(part);
  });

  it('certifies who agreed what, with the legend of the marks, and is the same each time', async () => {
    const { checker } = office.people;
    need(await concludeCheck(checker, { checkId, outcome: 'agreed', note: 'Held against A-201.' }));
    const once = await printCertificate(office.people.engineer, checkId);
    const again = await printCertificate(checker, checkId);
    expect(Buffer.from(once.bytes).equals(Buffer.from(again.bytes))).toBe(true);
    const text = textOf(once.bytes);
    expect(text).toMatch(/agreed, \d+ \w+ \d{4}/);
    expect(text).toContain('category 1, another member of the team (BS 5975-1:2024');
    expect(text).toContain('Held against A-201.');
    expect(text).toContain('agrees, CK');
    expect(text).toContain('query, CK');
    expect(text).not.toContain('preliminary');
    for (const part of schedule) expect(text).toContain(part);
  });

  it('goes out with the package', async () => {
    const submittal = await draftedSubmittal(office, jobId, [revisionId]);
    const text = textOf(await readSubmittalFile(office.people.engineer, submittal));
    expect(text).toContain('Checks of the sheets');
    for (const part of schedule) expect(text).toContain(part);
  });
});
