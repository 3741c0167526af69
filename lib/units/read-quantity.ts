import { describeDimension, pure, sameDimension } from './dimension';
import { ExpressionError, evaluateExpression, type Measured } from './evaluate-expression';
import { coherentFactor, type KindName, kinds, type UnitSetName } from './kind';
import { parseExpression } from './parse-expression';

export type Reading =
  /** `value` in coherent units; `arithmetic` when more than one number was typed, so that a form can show what it understood. */
  { ok: true; value: number; arithmetic: boolean } | { ok: false; message: string };

/**
 * Reads what a person typed into a field: a number in the field's own unit, a quantity with any unit of its kind, or
 * plain arithmetic of such. Variables (L for the span) are given in coherent units.
 */
export function readQuantity(
  text: string,
  kindName: KindName,
  set: UnitSetName,
  variables: Readonly<Record<string, { value: number; kind: KindName }>> = {},
): Reading {
  const kind = kinds[kindName];
  const example = `such as ${kind.example[set]}`;
  if (text.trim() === '') return { ok: false, message: `A ${kind.noun} is missing, ${example}.` };
  if (text.length > 200) return { ok: false, message: 'This is longer than a quantity can be.' };
  try {
    const known: Record<string, Measured> = {};
    for (const [name, v] of Object.entries(variables)) {
      const dimension = kinds[v.kind].dimension;
      known[name] = { si: v.value * coherentFactor(dimension, set), dimension };
    }
    const tree = parseExpression(text);
    const read = evaluateExpression(tree, known);
    const bare = sameDimension(read.dimension, pure) && !sameDimension(kind.dimension, pure);
    const measured = bare || kindName === 'angle' ? withDefaultUnit(read, kindName, set, text) : read;
    if (!sameDimension(measured.dimension, kind.dimension)) {
      const said = describeDimension(measured.dimension);
      return { ok: false, message: `That is ${said}. A ${kind.noun} is asked for, ${example}.` };
    }
    // Fifteen figures: what was typed in the sheet's own unit comes back as typed, not one bit beside it.
    const value = Number((measured.si / coherentFactor(kind.dimension, set)).toPrecision(15));
    if (!Number.isFinite(value)) return { ok: false, message: 'This number is too large to be worked with.' };
    return { ok: true, value, arithmetic: /[\d)]\s*[*/+×·^-]|[A-Za-z]\s*[*+]/.test(text) };
  } catch (error) {
    if (error instanceof ExpressionError) return { ok: false, message: error.message };
    if (error instanceof SyntaxError) {
      return { ok: false, message: `This is not a ${kind.noun} that can be read. Write it ${example}.` };
    }
    throw error;
  }
}

function withDefaultUnit(read: Measured, kindName: KindName, set: UnitSetName, text: string): Measured {
  const unit = kinds[kindName].unit[set];
  if (unit === '' || (kindName === 'angle' && /rad|deg|°/.test(text))) return read;
  const one = evaluateExpression(parseExpression(`1 ${unit}`.replace('1 1/', '1/')), {});
  return { si: read.si * one.si, dimension: one.dimension };
}
