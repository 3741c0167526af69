'use client';

import { useEffect, useState } from 'react';
import type { Draft } from '@/lib/model/draft';
import type { Writing } from './writing';

const pause = 60;
const retry = 2_000;

/**
 * Has the draft solved and written on the server a moment after each change. One request is under way at a time; the
 * newest draft goes next, and the pages last written stay until new ones are there.
 */
export function useWriting(draft: Draft, write: (draft: Draft) => Promise<Writing>) {
  const [writing, setWriting] = useState<Writing | undefined>();
  const [pages, setPages] = useState<Extract<Writing, { state: 'written' }> | undefined>();
  const [answered, setAnswered] = useState<Draft | undefined>();
  const [busy, setBusy] = useState(false);
  const [late, setLate] = useState(false);

  useEffect(() => {
    if (busy || answered === draft) return;
    const ask = async () => {
      setBusy(true);
      try {
        const answer = await write(draft);
        setAnswered(draft);
        setWriting(answer);
        setLate(false);
        if (answer.state === 'written') setPages(answer);
      } catch {
        setLate(true);
      } finally {
        setBusy(false);
      }
    };
    const timer = setTimeout(ask, late ? retry : pause);
    return () => clearTimeout(timer);
  }, [draft, answered, busy, late, write]);

  return { writing, pages, late };
}
