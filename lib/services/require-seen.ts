// server only
import type { Knex } from 'knex';
import { hiddenSheets } from '@/db/queries/own-sheets';
import type { Actor } from './actor';
import { NotAllowed } from './service-error';

/** Keeps the designer's sheet from a checker who works without it, until their own values stand beside it. */
export async function requireSeen(db: Knex, actor: Actor, sheetIds: readonly string[]): Promise<void> {
  if (await isHidden(db, actor, sheetIds)) throw new NotAllowed('the sheet is checked without being seen');
}

export async function isHidden(db: Knex, actor: Actor, sheetIds: readonly string[]): Promise<boolean> {
  return (await hiddenSheets(db, actor.officeId, actor.personId, sheetIds)).length > 0;
}
