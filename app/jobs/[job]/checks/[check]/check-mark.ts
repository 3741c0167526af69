import type { FormState } from '@/app/components/form-state';
import type { Mark } from '@/app/components/status-mark';

/** A mark as the screens of a check show it. */
export interface CheckMark {
  id: string;
  place: 'line' | 'input' | 'basis';
  /** Number of the line, or the place of the input in words, or what of the basis is asked about. */
  line: string;
  /** "line 7.5", or the place of the input. */
  where: string;
  kind: 'agrees' | 'correct' | 'query';
  text: string;
  drawing: string;
  state: MarkState;
  steps: { kind: MarkState; text: string; by: string; at: string }[];
}

export type MarkState = 'agrees' | 'open' | 'answered' | 'accepted' | 'reopened' | 'verified' | 'carried';

/** What an earlier revision left open. */
export interface EarlierMark {
  id: string;
  where: string;
  revision: number;
  kind: 'agrees' | 'correct' | 'query';
  text: string;
}

export type FormAction = (state: FormState, form: FormData) => Promise<FormState>;

/** A form action of one mark. */
export type MarkAction = (markId: string, state: FormState, form: FormData) => Promise<FormState>;

/** The shape that a state is shown with, and its word. */
export const stateShape: Record<Exclude<MarkState, 'agrees'>, { mark: Mark; word: string }> = {
  open: { mark: 'open', word: 'open' },
  answered: { mark: 'answered', word: 'answered' },
  accepted: { mark: 'accepted', word: 'accepted' },
  reopened: { mark: 'reopened', word: 'opened again' },
  verified: { mark: 'accepted', word: 'verified' },
  carried: { mark: 'reopened', word: 'carried on' },
};
