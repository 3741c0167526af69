import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { jobById } from '@/db/queries/jobs';
import { revisionById } from '@/db/queries/revisions';
import { fileOf } from '@/db/queries/submittals';
import { printPackage } from '@/lib/services/print-package';
import { verifyFile } from '@/lib/services/verification/verify-file';
import { makeBase } from '../signing/office';
import { append, drawOver } from '../signing/tamper';
import { type Filled, fillRecord } from './fill-record';

let filled: Filled;
let sealed: Uint8Array<ArrayBuffer>;
let unsigned: Uint8Array<ArrayBuffer>;
beforeAll(async () => {
  filled = await fillRecord();
  const bytesOf = async (kind: 'sealed' | 'unsigned') => {
    const file = await fileOf(database(), filled.office.id, filled.sent.submittalId, kind);
    if (!file) throw new Error(`no ${kind} file`);
    return new Uint8Array(file.bytes);
  };
  [sealed, unsigned] = [await bytesOf('sealed'), await bytesOf('unsigned')];
}, 60_000);
afterAll(() => database().destroy());

async function verify(bytes: Uint8Array) {
  const verified = await verifyFile(bytes, `test-${Math.random()}`);
  if (!verified) throw new Error('asked too often');
  return verified;
}

describe('a sealed package', () => {
  it('is intact, names who sealed it, and gives its results again', async () => {
    const { report, contents } = await verify(sealed);
    expect(report.intact).toBe(true);
    expect(report.signers.map((s) => s.holder)).toMatchObject([
      { name: 'Tomas Lindqvist', licenceNumber: 'SE 20417' },
    ]);
    expect(contents).toMatchObject({ ours: true, submittal: 1, job: { number: '26-001' } });
    const [sheet] = contents.ours ? contents.sheets : [];
    expect(sheet).toMatchObject({ sheet: 'S-02', solved: true, digestHolds: true, differing: [] });
  });

  it('is not intact once a page was drawn over', async () => {
    const { report } = await verify(await append(sealed, drawOver));
    expect(report.intact).toBe(false);
    expect(report.changes.map((c) => c.kind)).toContain('page-drawn-over');
  });
});

describe('an unsigned copy', () => {
  it('is known as ours, and as unsigned', async () => {
    const { report, contents } = await verify(unsigned);
    expect(report.reasons.map((r) => r.code)).toEqual(['not-signed']);
    expect(contents.ours).toBe(true);
  });

  it('with a stored result changed is found out by solving again', async () => {
    const db = database();
    const revision = await revisionById(db, filled.office.id, filled.sent.revisionId);
    const job = await jobById(db, filled.office.id, filled.jobId);
    if (!revision || !job) throw new Error('the record is missing');
    const results = JSON.parse(JSON.stringify(revision.results));
    const [first] = Object.values<{ reactions: { value: number }[] }>(results.reactions);
    const reaction = first?.reactions.find((r) => r.value !== 0);
    if (!reaction) throw new Error('no reaction');
    reaction.value *= 0.9;
    const people = { name: 'Eno Gin', initials: 'EG' };
    const printed = await printPackage(
      {
        office: 'Office',
        zone: 'UTC',
        job,
        purpose: 'for permit',
        submittal: 1,
        date: new Date(),
        engineer: people,
        originators: [people],
        checkers: [],
        history: [],
      },
      [{ ...revision, results }],
    );
    const { contents } = await verify(new Uint8Array(printed.bytes));
    const [sheet] = contents.ours ? contents.sheets : [];
    if (!sheet?.solved) throw new Error('it was not solved');
    expect(sheet.differing).toHaveLength(1);
    expect(sheet.differing[0]).toMatch(/^reactions\..+\.value$/);
    expect(sheet.digestHolds).toBe(false);
  });
});

describe('a file that is not ours', () => {
  it('is called so, whether it is a PDF or not', async () => {
    for (const bytes of [await makeBase(), Buffer.from('not a PDF'), Buffer.alloc(3)]) {
      const { report, contents } = await verify(new Uint8Array(bytes));
      expect(report.intact).toBe(false);
      expect(contents.ours).toBe(false);
    }
  });
});

describe('a damaged package', () => {
  it('is never called intact and never fails, wherever the damage is', async () => {
    for (let i = 0; i < 120; i++) {
      const bytes = Uint8Array.from(sealed);
      const at = Math.floor((i / 120) * bytes.length);
      bytes[at] = (bytes[at] as number) ^ 0x15;
      expect((await verify(bytes)).report.intact).toBe(false);
    }
  });
});

describe('somebody who sends file after file', () => {
  it('is asked to wait', async () => {
    const from = `test-${Math.random()}`;
    const small = Buffer.from('no');
    for (let i = 0; i < 30; i++) expect(await verifyFile(small, from)).toBeDefined();
    expect(await verifyFile(small, from)).toBeUndefined();
  });
});
