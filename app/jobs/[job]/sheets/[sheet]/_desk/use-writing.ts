'use client';

import { useEffect, useState } from 'react';
import type { Draft } from '@/lib/model/draft';
import { keepBlocks } from './keep-blocks';
import type { Overlay, Writing, WrittenPages } from './writing';

const pause = 60;
const retry = 2_000;

/**
 * Has the draft solved and written on the server a moment after each change. One request is under way at a time; the
 * newest draft goes next, and the pages last written stay until new ones are there. `overlay` names the diagram wanted
 * over the drawing.
 */
export function useWriting(
  draft: Draft,
  overlay: Overlay,
  write: (draft: Draft, overlay: Overlay) => Promise<Writing>,
) {
  const [writing, setWriting] = useState<Writing | undefined>();
  const [pages, setPages] = useState<WrittenPages | undefined>();
  const [answered, setAnswered] = useState<{ draft: Draft; overlay: Overlay } | undefined>();
  const [busy, setBusy] = useState(false);
  const [late, setLate] = useState(false);

  useEffect(() => {
    if (busy || (answered?.draft === draft && answered.overlay === overlay)) return;
    const ask = async () => {
      setBusy(true);
      try {
        const answer = await write(draft, overlay);
        setAnswered({ draft, overlay });
        setWriting(answer);
        setLate(false);
        if (answer.state === 'written')
          setPages((last) => ({ ...answer, blocks: keepBlocks(last?.blocks ?? [], answer.blocks) }));
      } catch {
        setLate(true);
      } finally {
        setBusy(false);
      }
    };
    const timer = setTimeout(ask, late ? retry : pause);
    return () => clearTimeout(timer);
  }, [draft, overlay, answered, busy, late, write]);

  return { writing, pages, late };
}
