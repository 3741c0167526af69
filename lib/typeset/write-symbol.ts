import type { SymbolName } from '@/lib/engine/derivation/symbol-name';
import { nameInTex } from '@/lib/figures/name-in-tex';

const letters: Record<string, string> = {
  δ: '\\delta',
  μ: '\\mu',
  α: '\\alpha',
  κ: '\\kappa',
  Δ: '\\Delta',
  θ: '\\theta',
  ℓ: '\\ell',
  cosα: '\\cos\\alpha',
  sinα: '\\sin\\alpha',
  ΔT: '\\Delta T',
  EI0: 'EI_0',
};

const marks: Record<string, string> = { ',': ',', '–': '\\text{–}', φ: '\\varphi', '*': '*' };

/** TeX of a symbol: `\bar{R}_{Ay,1}`, `M_{AB}^{\mathrm{D}}`, `EI_0\,\delta_{10}`. */
export function symbolTex(s: SymbolName): string {
  const letter = letters[s.letter] ?? s.letter;
  const body = s.mark ? `\\${s.mark}{${letter}}` : letter;
  const sub = (s.sub ?? []).map((part) => marks[part] ?? nameInTex(part)).join('');
  const below = sub === '' ? '' : `_{${sub}}`;
  const above = s.super === undefined ? '' : `^{${caseTex(s.super)}}`;
  return `${s.timesEI0 ? 'EI_0\\,' : ''}${body}${below}${above}`;
}

/** The name of a load case or combination, upright. */
export function caseTex(id: string): string {
  // A bare figure above a symbol would read as a power.
  if (/^\d+$/.test(id)) return `\\mathrm{(${id})}`;
  const name = nameInTex(id);
  return name.startsWith('\\mathrm') ? name : `\\mathrm{${name}}`;
}
