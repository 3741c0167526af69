import type { Expression, Value } from '@/lib/engine/derivation/expression';
import type { UnitSet } from '@/lib/model/analysis';
import { fractionTex } from './number';
import { quantityTex } from './quantity-tex';
import { symbolTex } from './write-symbol';

/** A piece of TeX and how tightly it binds: 0 a sum, 1 a product, 2 whole by itself. */
interface Piece {
  tex: string;
  binds: 0 | 1 | 2;
}

type Mode = { figures: boolean; units: UnitSet };

/** The formula in symbols: `\frac{wL^2}{8}`. */
export const formulaTex = (e: Expression, units: UnitSet): string => write(e, { figures: false, units }).tex;

/** The formula with its figures and units put in: `\frac{24.60\unit{kip}\times40.00\unit{ft}}{8}`. */
export const substitutionTex = (e: Expression, units: UnitSet): string =>
  write(e, { figures: true, units }).tex;

function write(e: Expression, mode: Mode): Piece {
  switch (e.kind) {
    case 'value':
      return writeValue(e, mode);
    case 'number':
      return { tex: fractionTex(e.n, e.d), binds: e.n < 0 ? 1 : 2 };
    case 'sum':
      return { tex: joinTerms(e.terms.map((t) => write(t, mode).tex)), binds: 0 };
    case 'product':
      return { tex: joinFactors(e.factors, mode), binds: 1 };
    case 'quotient':
      return { tex: `\\frac{${write(e.over, mode).tex}}{${write(e.under, mode).tex}}`, binds: 2 };
    case 'power': {
      const base = write(e.base, mode);
      const plain = base.binds === 2 && e.base.kind === 'value' && !mode.figures && !e.base.symbol?.super;
      return { tex: `${plain ? base.tex : bracket(base.tex)}^{${e.exponent}}`, binds: 2 };
    }
    case 'root':
      return { tex: `\\sqrt{${write(e.of, mode).tex}}`, binds: 2 };
    case 'negative':
      return { tex: `-${negated(e.of, mode)}`, binds: 1 };
  }
}

function writeValue(v: Value, mode: Mode): Piece {
  if (!mode.figures && v.symbol) return { tex: symbolTex(v.symbol), binds: v.symbol.timesEI0 ? 1 : 2 };
  return { tex: quantityTex(v, mode.units), binds: 2 };
}

/** Terms with their signs between them; a negative one is taken off. */
function joinTerms(terms: readonly string[]): string {
  return terms.map((t, i) => (i === 0 ? t : t.startsWith('-') ? `-${t.slice(1)}` : `+${t}`)).join('');
}

/** What stands behind a minus sign: a negative first factor goes in brackets by itself. */
function negated(e: Expression, mode: Mode): string {
  if (e.kind === 'product') return joinFactors(e.factors, mode, true);
  const { tex, binds } = write(e, mode);
  return binds === 0 || tex.startsWith('-') ? bracket(tex) : tex;
}

function joinFactors(factors: readonly Expression[], mode: Mode, first = false): string {
  const pieces = factors.map((f, i) => {
    const { tex, binds } = write(f, mode);
    return binds === 0 || ((first || i > 0) && tex.startsWith('-')) ? bracket(tex) : tex;
  });
  return pieces.join(mode.figures ? '\\times ' : '\\,');
}

const bracket = (tex: string) => (/\\frac/.test(tex) ? `\\left(${tex}\\right)` : `(${tex})`);
