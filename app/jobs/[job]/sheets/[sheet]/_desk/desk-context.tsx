'use client';

import { createContext, type ReactNode, useContext } from 'react';
import type { ShapeRef } from '@/lib/figures/drawing';
import type { Draft } from '@/lib/model/draft';
import type { FieldError } from '@/lib/model/field-reader';

export interface DeskContext {
  draft: Draft;
  /** Writes one place of the draft: `edit('geometry.span', '7.20 m')`. */
  edit: (path: string, value: unknown) => void;
  /** Changes several places as one step to undo. */
  change: (name: string, apply: (draft: Draft) => Draft) => void;
  errors: readonly FieldError[];
  /** Fields left once; a field still being filled in is not scolded. */
  visited: ReadonlySet<string>;
  visit: (path: string) => void;
  lit: ShapeRef | undefined;
  light: (ref: ShapeRef | undefined) => void;
  /** Opens what belongs to an element of the drawing: a joint's support, a member's load. */
  open: (ref: ShapeRef) => void;
  /** Puts the focus on the field at `path`, on whichever step it stands. */
  goTo: (path: string) => void;
}

const Context = createContext<DeskContext | undefined>(undefined);

export function DeskProvider({ value, children }: { value: DeskContext; children: ReactNode }) {
  return <Context value={value}>{children}</Context>;
}

export function useDesk(): DeskContext {
  const desk = useContext(Context);
  if (!desk) throw new Error('useDesk outside of a desk');
  return desk;
}

/** The sentence to show at a field: none while the field is blank and was never left. */
export function useFieldError(path: string, text: string): string | undefined {
  const { errors, visited } = useDesk();
  const error = errors.find((e) => e.path === path);
  return error && (text.trim() !== '' || visited.has(path)) ? error.message : undefined;
}
