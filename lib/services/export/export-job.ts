// server only
import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import { database } from '@/db/connection';
import { findAudit } from '@/db/queries/audit';
import { marksOf } from '@/db/queries/checks';
import { jobById } from '@/db/queries/jobs';
import { commentsOfJob } from '@/db/queries/reviews';
import { type RevisionLine, revisionsOfSheet } from '@/db/queries/revisions';
import { newestDraft, sheetLines } from '@/db/queries/sheets';
import { fileOf, submittalsOf } from '@/db/queries/submittals';
import type { Actor } from '../actor';
import { inTransaction } from '../in-transaction';
import { makers, requireRole } from '../require-role';
import { requireSeen } from '../require-seen';
import { NotFound } from '../service-error';
import { sheetName } from '../sheet-state';
import { indexPage } from './index-page';
import { commentRegister, markRegister, recordRegister, revisionRegister } from './job-registers';
import { zipOf } from './zip';

export interface Exported {
  name: string;
  bytes: Uint8Array;
}

interface Listed {
  path: string;
  words: string;
  bytes: Uint8Array;
}

const text = (path: string, words: string, content: string): Listed => ({
  path,
  words,
  bytes: new TextEncoder().encode(content),
});
const json = (path: string, words: string, value: unknown): Listed =>
  text(path, words, `${JSON.stringify(value, null, 2)}\n`);

/** Longest record that is written out: entries of one job. */
const mostEntries = 100_000;

/**
 * A whole job as one ZIP that needs no product to be read: the packages as PDF, inputs and results as JSON, registers as
 * CSV, a page that leads to them, and the SHA-256 of every file. The record keeps that it was taken out.
 */
export async function exportJob(actor: Actor, jobId: string): Promise<Exported> {
  requireRole(actor, 'administrator', ...makers);
  const { officeId } = actor;
  const db = database();
  const job = await jobById(db, officeId, jobId);
  if (!job) throw new NotFound(`job ${jobId}`);
  const revisions = await revisionsOfJob(db, officeId, jobId);
  await requireSeen(
    db,
    actor,
    revisions.map((r) => r.sheet_id),
  );
  const sheets = [...revisions.map(revisionFile), ...(await draftFiles(db, officeId, jobId))];
  const packages = await packageFiles(db, officeId, jobId);
  const registers = await registersOf(db, officeId, jobId, revisions);
  const facts = [actor.officeName, job.place, job.authority ?? '', `Taken out ${new Date().toISOString()}`];
  const page = indexPage(`${job.number} ${job.title}`, facts.filter(Boolean), [
    { title: 'Packages', files: packages },
    { title: 'Sheets', files: sheets },
    { title: 'Registers', files: registers },
  ]);
  const { id: _id, office_id: _office, authority_id: _authority, ...facing } = job;
  const files = [
    text('index.html', '', page),
    json('job.json', '', { form: 'fairhand.job/1', ...facing }),
    ...packages,
    ...sheets,
    ...registers,
  ];
  const sums = files
    .map((f) => `${createHash('sha256').update(f.bytes).digest('hex')}  ${f.path}\n`)
    .join('');
  const bytes = zipOf([...files, text('SHA256SUMS', '', sums)]);
  const digest = createHash('sha256').update(bytes).digest('hex');
  await inTransaction(actor, async (_trx, record) => record('took out', job.number, { digest, jobId }));
  return { name: `${job.number.replace(/[^\w.-]+/g, '-')}.zip`, bytes };
}

async function revisionsOfJob(db: Knex, officeId: string, jobId: string): Promise<RevisionLine[]> {
  const sheets = await sheetLines(db, officeId, [jobId]);
  const found = await Promise.all(sheets.map((s) => revisionsOfSheet(db, officeId, s.id)));
  return found.flat().sort((a, b) => a.sheet_number - b.sheet_number || a.number - b.number);
}

function revisionFile(r: RevisionLine): Listed {
  const { inputs, results, blocks, engine, digest, reason } = r;
  const name = sheetName(r.sheet_number);
  const body = { form: 'fairhand.revision/1', sheet: name, revision: r.number, title: r.title, reason };
  return json(`sheets/${name}-revision-${r.number}.json`, `${r.title}, sha256 ${digest}`, {
    ...body,
    engine,
    digest,
    inputs,
    results,
    blocks,
  });
}

async function draftFiles(db: Knex, officeId: string, jobId: string): Promise<Listed[]> {
  const sheets = await sheetLines(db, officeId, [jobId]);
  const files = await Promise.all(
    sheets.map(async (s) => {
      const draft = await newestDraft(db, officeId, s.id);
      const name = sheetName(s.number);
      return draft
        ? [json(`sheets/${name}-draft.json`, `${s.title}, draft ${draft.version}`, draft.body)]
        : [];
    }),
  );
  return files.flat();
}

async function packageFiles(db: Knex, officeId: string, jobId: string): Promise<Listed[]> {
  const files: Listed[] = [];
  for (const s of await submittalsOf(db, officeId, jobId)) {
    for (const kind of ['unsigned', 'sealed'] as const) {
      const file = await fileOf(db, officeId, s.id, kind);
      if (!file) continue;
      const words = [s.purpose, file.signed_by, s.decision, `sha256 ${file.sha256}`]
        .filter(Boolean)
        .join(', ');
      files.push({
        path: `packages/submittal-${s.number}-${kind}.pdf`,
        words,
        bytes: new Uint8Array(file.bytes),
      });
    }
  }
  return files;
}

async function registersOf(
  db: Knex,
  officeId: string,
  jobId: string,
  revisions: readonly RevisionLine[],
): Promise<Listed[]> {
  const marks = await Promise.all(
    revisions.map(async (revision) =>
      revision.check_id
        ? (await marksOf(db, officeId, revision.check_id)).map((mark) => ({ revision, mark }))
        : [],
    ),
  );
  const entries = await findAudit(db, officeId, { jobId }, { size: mostEntries, offset: 0 });
  return [
    text('registers/revisions.csv', 'every revision', revisionRegister(revisions)),
    text('registers/marks.csv', 'every mark of a checker', markRegister(marks.flat())),
    text(
      'registers/comments.csv',
      'every comment of a reviewer',
      commentRegister(await commentsOfJob(db, officeId, jobId)),
    ),
    text('registers/record.csv', 'who did what to which digest', recordRegister(entries.reverse())),
  ];
}
