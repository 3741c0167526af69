import type { SheetLine } from '@/db/queries/sheets';

export type SheetState = 'draft' | 'frozen' | 'checking' | 'checked' | 'returned' | 'sealed';

/** Where a sheet stands. A draft that went on after its last revision is a draft again. */
export function sheetState(
  s: Pick<SheetLine, 'frozen_at' | 'draft_at' | 'check_state' | 'sealed'>,
): SheetState {
  if (!s.frozen_at) return 'draft';
  if (s.draft_at && s.draft_at > s.frozen_at) return 'draft';
  if (Number(s.sealed) === 1) return 'sealed';
  switch (s.check_state) {
    case 'open':
      return 'checking';
    case 'agreed':
      return 'checked';
    case 'returned':
      return 'returned';
    default:
      return 'frozen';
  }
}

/** "S-03", the number a sheet keeps for good. */
export function sheetName(number: number): string {
  return `S-${String(number).padStart(2, '0')}`;
}
