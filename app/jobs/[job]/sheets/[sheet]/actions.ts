'use server';

import { z } from 'zod';
import { orRefuse, requireActor } from '@/app/session';
import type { Draft } from '@/lib/model/draft';
import { draft as draftSchema } from '@/lib/model/draft';
import { type Quantity, quantity as quantitySchema } from '@/lib/model/quantity';
import { freezeSheet as freeze } from '@/lib/services/freeze-sheet';
import { keepDraft as keep } from '@/lib/services/keep-draft';
import { listDraftVersions } from '@/lib/services/list-draft-versions';
import { openDraftVersion } from '@/lib/services/open-draft-version';
import {
  type Keeping,
  type OpenedVersion,
  type Overlay,
  overlays,
  type Trial,
  type VersionLine,
  type Writing,
} from './_desk/writing';
import { describeTrial } from './describe-trial';
import { describeWriting } from './describe-writing';

const chosen = quantitySchema.array().max(2_000, 'At most 2,000 redundants can be chosen.');

/** Every sentence of what a schema refuses, once. */
function sayIssues(error: z.ZodError): string {
  return [...new Set(error.issues.map((i) => i.message))].join(' ');
}

/** Keeps a draft on top of the version it was made from. */
export async function keepDraft(sheetId: string, version: number, draft: Draft): Promise<Keeping> {
  const actor = await requireActor();
  const parsed = draftSchema.safeParse(draft);
  if (!parsed.success) return { ok: false, reason: 'refused', message: sayIssues(parsed.error) };
  const kept = await orRefuse(keep(actor, { sheetId, version, draft: parsed.data }));
  return kept.ok
    ? { ok: true, version: kept.version, keptAt: kept.keptAt.toISOString() }
    : {
        ok: false,
        reason: 'conflict',
        version: kept.version,
        draft: kept.draft,
        by: kept.by,
        at: kept.at.toISOString(),
      };
}

/** Solves and writes a draft for the live page. Nothing is stored. */
export async function writeCalculation(draft: Draft, overlay: Overlay): Promise<Writing> {
  await requireActor();
  const parsed = draftSchema.safeParse(draft);
  if (!parsed.success) {
    return {
      state: 'incomplete',
      errors: parsed.error.issues.map((i) => ({ path: i.path.join('.'), message: i.message })),
    };
  }
  return describeWriting(parsed.data, z.enum(overlays).parse(overlay));
}

/** Tries another set of redundants on a draft. */
export async function tryRedundants(draft: Draft, quantities: Quantity[]): Promise<Trial> {
  await requireActor();
  const parsed = z.object({ draft: draftSchema, quantities: chosen }).safeParse({ draft, quantities });
  if (!parsed.success) return { good: false, message: sayIssues(parsed.error), drawing: undefined };
  return describeTrial(parsed.data.draft, parsed.data.quantities);
}

/** A page of the history of the draft, newest first, and whether there is more. */
export async function listVersions(
  sheetId: string,
  page: number,
): Promise<{ versions: VersionLine[]; more: boolean }> {
  const actor = await requireActor();
  const versions = await orRefuse(listDraftVersions(actor, { sheetId, page }));
  return {
    versions: versions.map((v) => ({ ...v, keptAt: v.keptAt.toISOString() })),
    more: (versions.at(-1)?.version ?? 1) > 1,
  };
}

export async function openVersion(sheetId: string, version: number): Promise<OpenedVersion> {
  const actor = await requireActor();
  const opened = await orRefuse(openDraftVersion(actor, { sheetId, version }));
  return { ...opened, keptAt: opened.keptAt.toISOString() };
}

/** Freezes the sheet; answers where the revision can be read. */
export async function freezeSheet(
  sheetId: string,
  reason: string,
): Promise<{ ok: true; to: string } | { ok: false; message: string }> {
  const actor = await requireActor();
  const frozen = await orRefuse(freeze(actor, { sheetId, reason }));
  return frozen.ok
    ? { ok: true, to: `/jobs/${frozen.value.jobId}/revisions/${frozen.value.revisionId}` }
    : { ok: false, message: frozen.errors[0]?.message ?? 'The sheet could not be frozen.' };
}
