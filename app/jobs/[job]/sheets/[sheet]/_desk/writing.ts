import type { Drawing } from '@/lib/figures/drawing';
import type { Draft } from '@/lib/model/draft';
import type { FieldError } from '@/lib/model/field-reader';
import type { Quantity } from '@/lib/model/quantity';
import type { Refusal } from '@/lib/model/refusal';
import type { Block } from '@/templates/block';

/** A force quantity as the desk shows it: its symbol and what releasing it means. */
export interface QuantityChoice {
  quantity: Quantity;
  key: string;
  /** Rich text: "$M_{2}$". */
  symbol: string;
  /** "hinge at 2", "roller at 4", "cut in 2–3". */
  words: string;
}

export interface FixedQuantity extends QuantityChoice {
  values: { case: string; value: string }[];
}

/** What may be drawn over the structure: axial force, shear, moment, or the deflected shape. */
export const overlays = ['N', 'V', 'M', 'deflected'] as const;
export type Overlay = (typeof overlays)[number];

export type WrittenPages = Extract<Writing, { state: 'written' }>;

/** What the server says of a draft: its written pages, what is still missing, or why it cannot be solved. */
export type Writing =
  | {
      state: 'written';
      blocks: Block[];
      milliseconds: number;
      degree: number;
      redundants: QuantityChoice[];
      proposed: boolean;
      condition: number;
      choices: QuantityChoice[];
      fixed: FixedQuantity[];
      reactions: { symbol: string; values: { case: string; value: string }[]; unit: string }[];
      combinations: { id: string; source: string }[];
      checks: { subject: string; residual: string; tolerance: string; holds: boolean }[];
      primary?: Drawing;
      units: { symbol: string; drawing: Drawing }[];
      /** The diagram asked for, a drawing a case in their order. */
      overlay: { which: Overlay; drawings: Drawing[] };
    }
  | { state: 'incomplete'; errors: FieldError[] }
  | { state: 'refused'; refusal: Refusal; drawing?: Drawing };

/** The answer about one set of redundants that was tried. */
export type Trial =
  | { good: true; condition: number; drawing: Drawing | undefined }
  | { good: false; message: string; drawing: Drawing | undefined };

/** What keeping a draft answers: kept, or somebody else's version stands there by now. */
export type Keeping =
  | { ok: true; version: number; keptAt: string }
  | { ok: false; reason: 'conflict'; version: number; draft: unknown; by: string; at: string }
  | { ok: false; reason: 'refused'; message: string };

/** One kept version of the draft in its history. */
export interface VersionLine {
  version: number;
  keptAt: string;
  by: string;
}

export interface OpenedVersion extends VersionLine {
  draft: Draft;
}
