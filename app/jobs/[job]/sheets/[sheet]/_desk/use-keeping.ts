'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import { z } from 'zod';
import { type Draft, draft as draftSchema } from '@/lib/model/draft';
import type { Keeping } from './writing';

export type KeepingState =
  | { state: 'kept'; at: string }
  | { state: 'keeping' }
  /** Neither kept nor lost: in this browser until the server answers again. */
  | { state: 'offline' }
  | { state: 'refused'; message: string }
  | { state: 'conflict'; by: string; at: string; version: number; theirs: unknown };

const pause = 350;
const retry = 3_000;

const backupSchema = z.object({ version: z.number(), draft: draftSchema });
const backupKey = (sheetId: string) => `fairhand:draft:${sheetId}`;

/** The draft this browser could not hand over before it was closed, if it continues the version the server has. */
export function readBackup(sheetId: string, version: number): Draft | undefined {
  const text = window.localStorage.getItem(backupKey(sheetId));
  if (text === null) return undefined;
  const backup = backupSchema.safeParse(JSON.parse(text));
  return backup.success && backup.data.version === version ? backup.data.draft : undefined;
}

/**
 * Keeps a draft on the server a moment after each change. While the server does not answer, the draft stays in this
 * browser and is handed over later; when somebody else kept another version meanwhile, nothing is overwritten and the
 * person chooses.
 */
export function useKeeping(
  sheetId: string,
  draft: Draft,
  initial: { version: number; keptAt: string },
  keep: (version: number, draft: Draft) => Promise<Keeping>,
) {
  const [state, setState] = useState<KeepingState>({ state: 'kept', at: initial.keptAt });
  const version = useRef(initial.version);
  const handed = useRef(draft);
  const under = useRef<Promise<void> | undefined>(undefined);
  const latest = useRef(draft);
  latest.current = draft;

  const send = useCallback(async () => {
    const sent = latest.current;
    setState((s) => (s.state === 'offline' ? s : { state: 'keeping' }));
    try {
      const answer = await keep(version.current, sent);
      if (answer.ok) {
        version.current = answer.version;
        handed.current = sent;
        window.localStorage.removeItem(backupKey(sheetId));
        setState({ state: 'kept', at: answer.keptAt });
      } else if (answer.reason === 'conflict') {
        setState({
          state: 'conflict',
          by: answer.by,
          at: answer.at,
          version: answer.version,
          theirs: answer.draft,
        });
      } else {
        // It stays in this browser; the next change is handed over again.
        handed.current = sent;
        setState({ state: 'refused', message: answer.message });
      }
    } catch {
      setState({ state: 'offline' });
    }
  }, [keep, sheetId]);

  /** Resolves when the draft as it stands now was handed over, after what is under way. */
  const handOver = useCallback(async () => {
    while (under.current) await under.current;
    if (handed.current === latest.current) return;
    under.current = send().finally(() => {
      under.current = undefined;
    });
    await under.current;
  }, [send]);

  const stopped = state.state === 'conflict';
  useEffect(() => {
    if (handed.current === draft) return;
    window.localStorage.setItem(backupKey(sheetId), JSON.stringify({ version: version.current, draft }));
    if (stopped) return;
    const timer = setTimeout(handOver, state.state === 'offline' ? retry : pause);
    return () => clearTimeout(timer);
  }, [draft, state, stopped, handOver, sheetId]);

  /** After a conflict: go on from the version that stands there, with one's own draft or with theirs. */
  const goOn = useCallback((at: number, taken: Draft | undefined) => {
    version.current = at;
    if (taken) handed.current = taken;
    setState({ state: 'keeping' });
  }, []);

  return { state, goOn, handOver };
}
