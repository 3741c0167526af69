// server only
import { createHash } from 'node:crypto';
import type { RevisionRow } from '@/db/queries/revisions';

/** SHA-256 over inputs, results, written lines and the engine's version, as JSON in this order. */
export function revisionDigest(r: Pick<RevisionRow, 'inputs' | 'results' | 'blocks' | 'engine'>): string {
  return createHash('sha256')
    .update(JSON.stringify([r.inputs, r.results, r.blocks, r.engine]))
    .digest('hex');
}
