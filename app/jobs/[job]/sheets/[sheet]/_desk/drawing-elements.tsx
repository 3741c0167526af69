'use client';

import { FieldReader } from '@/lib/model/field-reader';
import { readGeometry } from '@/lib/model/read-geometry';
import { supportRows } from '@/lib/model/support-rows';
import { useDesk } from './desk-context';

/** What a click on the drawing does, as buttons: each joint leads to its support, each member to its load. */
export function DrawingElements() {
  const { draft, light, open } = useDesk();
  const members = readGeometry(new FieldReader(draft.units), draft).members;
  const held = new Set(supportRows(draft).map((r) => r.joint));
  const refs = [
    ...[...held].map((id) => ({ of: 'joint' as const, id, words: `Support at ${id}` })),
    ...members.map(({ id }) => ({ of: 'member' as const, id, words: `Load on ${id}` })),
  ];
  return (
    <details className="elements">
      <summary>Joints and members</summary>
      <ul aria-label="Joints and members">
        {refs.map(({ of, id, words }) => (
          <li key={`${of} ${id}`}>
            <button
              type="button"
              className="linkish"
              onFocus={() => light({ of, id })}
              onBlur={() => light(undefined)}
              onClick={() => open({ of, id })}
            >
              {words}
            </button>
          </li>
        ))}
      </ul>
    </details>
  );
}
