// server only
import type { Knex } from 'knex';
import type { SheetRow } from '@/db/queries/sheets';
import { type SubmittalRow, submittalsWithSheet, voidSubmittal } from '@/db/queries/submittals';
import type { Record } from './in-transaction';

export interface TouchedSubmittals {
  /** Prepared or sealed, not sent: void by now. */
  voided: SubmittalRow[];
  /** With the reviewer or decided: they stand as they were sent. */
  standing: SubmittalRow[];
}

/** Makes void the submittals that hold an earlier revision of a sheet and did not leave the office. */
export async function voidSubmittalsOf(
  trx: Knex.Transaction,
  record: Record,
  sheet: SheetRow,
  reason: string,
): Promise<TouchedSubmittals> {
  const touched = await submittalsWithSheet(trx, sheet.office_id, sheet.id);
  const voided = touched.filter((s) => s.state === 'drafted' || s.state === 'sealed');
  for (const s of voided) {
    await voidSubmittal(trx, sheet.office_id, s.id, reason);
    await record('made void', `submittal ${s.number}: ${reason}`, { jobId: s.job_id, aboutId: s.id });
  }
  return { voided, standing: touched.filter((s) => s.state === 'sent' || s.state === 'decided') };
}
