'use client';

import type { KeepingState } from './use-keeping';

const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', second: '2-digit' });

/** What became of the last change, in the foot line. */
export function KeepingLine({ state }: { state: KeepingState }) {
  return (
    <span
      role="status"
      className={state.state === 'kept' || state.state === 'keeping' ? undefined : 'text-seal'}
    >
      {sentence(state)}
    </span>
  );
}

function sentence(state: KeepingState): string {
  switch (state.state) {
    case 'kept':
      return `Kept ${clock.format(new Date(state.at))}`;
    case 'keeping':
      return 'Keeping …';
    case 'offline':
      return 'No connection. Kept in this browser until there is one.';
    case 'refused':
      return state.message;
    case 'conflict':
      return `${state.by} changed this sheet meanwhile. Nothing is overwritten.`;
  }
}
