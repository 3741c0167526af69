import type { ReactNode } from 'react';
import { renderTex } from './render-tex';

/** A formula in the run of a line; `display` gives fractions their full size. */
export function Tex({ children, display = false }: { children: string; display?: boolean }): ReactNode {
  return renderTex(display ? `\\displaystyle ${children}` : children);
}
