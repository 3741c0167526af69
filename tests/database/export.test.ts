import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { unzipSync } from 'fflate';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { exportJob } from '@/lib/services/export/export-job';
import { readAudit } from '@/lib/services/read-audit';
import { revisionDigest } from '@/lib/services/revision-digest';
import { type Filled, fillRecord } from './fill-record';

let filled: Filled;
let zip: Uint8Array;
let files: Map<string, Buffer>;
beforeAll(async () => {
  filled = await fillRecord();
  zip = (await exportJob(filled.office.people.engineer, filled.jobId)).bytes;
  files = new Map(Object.entries(unzipSync(zip)).map(([path, bytes]) => [path, Buffer.from(bytes)]));
}, 60_000);
afterAll(() => database().destroy());

const textOf = (path: string) => files.get(path)?.toString('utf8') ?? '';

describe('a job that is taken out', () => {
  it('is an archive that another program finds whole', () => {
    const path = join(mkdtempSync(join(tmpdir(), 'fairhand-export-')), 'job.zip');
    writeFileSync(path, zip);
    const said = execFileSync('unzip', ['-t', path], { encoding: 'utf8' });
    expect(said).toContain('No errors detected');
  });

  it('holds the packages, sheets and registers, and its page leads to each', () => {
    const page = textOf('index.html');
    for (const path of files.keys())
      if (!/^(index\.html|job\.json|SHA256SUMS)$/.test(path)) expect(page).toContain(`href="${path}"`);
    expect([...files.keys()].sort()).toEqual([
      'SHA256SUMS',
      'index.html',
      'job.json',
      'packages/submittal-1-sealed.pdf',
      'packages/submittal-1-unsigned.pdf',
      'registers/comments.csv',
      'registers/marks.csv',
      'registers/record.csv',
      'registers/revisions.csv',
      'sheets/S-01-draft.json',
      'sheets/S-01-revision-0.json',
      'sheets/S-02-draft.json',
      'sheets/S-02-revision-0.json',
    ]);
  });

  it('names the SHA-256 of every file, and each is right', () => {
    const lines = textOf('SHA256SUMS').trim().split('\n');
    expect(lines).toHaveLength(files.size - 1);
    for (const line of lines) {
      const [sum, path] = line.split('  ') as [string, string];
      expect(
        createHash('sha256')
          .update(files.get(path) as Buffer)
          .digest('hex'),
      ).toBe(sum);
    }
  });

  it('carries revisions from which their digest can be reckoned again', () => {
    const revision = JSON.parse(textOf('sheets/S-02-revision-0.json'));
    expect(revisionDigest(revision)).toBe(revision.digest);
  });

  it('carries the sealed file as it was sent', async () => {
    const row = await database()('files')
      .where({ submittal_id: filled.sent.submittalId, kind: 'sealed' })
      .first();
    expect(files.get('packages/submittal-1-sealed.pdf')?.equals(row.bytes)).toBe(true);
  });

  it('says what was asked and answered', () => {
    expect(textOf('registers/marks.csv')).toContain('Which drawing is this from?,From A-201.');
    expect(textOf('registers/comments.csv')).toContain('It is A-201.,S-02.1');
    expect(textOf('registers/record.csv')).toMatch(/,sealed,26-001 submittal 1,[0-9a-f]{64},/);
  });

  it('stands in the record with the digest of the archive', async () => {
    const [entry] = (await readAudit(filled.office.people.engineer, { jobId: filled.jobId })).entries;
    expect(entry?.verb).toBe('took out');
    expect(entry?.digest).toBe(createHash('sha256').update(zip).digest('hex'));
  });
});
