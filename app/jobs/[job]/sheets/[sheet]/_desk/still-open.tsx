'use client';

import type { FieldError } from '@/lib/model/field-reader';
import { useDesk } from './desk-context';

const most = 3;

/** What a step still lacks, each sentence leading to its field. */
export function StillOpen({ errors }: { errors: readonly FieldError[] }) {
  const { goTo } = useDesk();
  if (errors.length === 0) return null;
  const more = errors.length - most;
  return (
    <section className="stillopen" aria-label="Still open">
      <ul>
        {errors.slice(0, most).map((e) => (
          <li key={e.path}>
            <button type="button" className="linkish" onClick={() => goTo(e.path)}>
              {e.message}
            </button>
          </li>
        ))}
      </ul>
      {more > 0 ? <p className="ans">and {more} more.</p> : null}
    </section>
  );
}
