import type { MathNode } from 'mathjs/number';
import { combineDimensions, type Dimension, pure, sameDimension } from './dimension';
import { type Unit, units } from './unit';

/** A value in newton, metre, kelvin with its dimension. */
export interface Measured {
  si: number;
  dimension: Dimension;
}

/** A place in the arithmetic that has no meaning as a quantity; the message is for the person who typed it. */
export class ExpressionError extends Error {}

/**
 * Works a parsed expression out, units and all. Only numbers, + − × ÷, whole powers, brackets, units and the given
 * variables are known; anything else (functions, assignments, strings) is refused, never run.
 */
export function evaluateExpression(node: MathNode, variables: Readonly<Record<string, Measured>>): Measured {
  if ('content' in node && node.type === 'ParenthesisNode') {
    return evaluateExpression(node.content as MathNode, variables);
  }
  if (node.type === 'ConstantNode' && 'value' in node && typeof node.value === 'number') {
    return { si: node.value, dimension: pure };
  }
  if (node.type === 'SymbolNode' && 'name' in node) return symbolValue(String(node.name), variables);
  if (node.type === 'OperatorNode' && 'fn' in node && 'args' in node) {
    const args = (node.args as MathNode[]).map((a) => evaluateExpression(a, variables));
    return operate(String(node.fn), args);
  }
  throw new ExpressionError('Only numbers, units, brackets and + − × ÷ ^ are read here.');
}

function symbolValue(name: string, variables: Readonly<Record<string, Measured>>): Measured {
  const variable = Object.hasOwn(variables, name) ? variables[name] : undefined;
  if (variable) return variable;
  const plain = unitNamed(name);
  if (plain) return { si: plain.factor, dimension: plain.dimension };
  const powered = /^([A-Za-z]+)([234])$/.exec(name);
  const base = powered ? unitNamed(powered[1] ?? '') : undefined;
  if (!base) throw new ExpressionError(`“${name}” is not a unit or a name that is known here.`);
  return operate('pow', [
    { si: base.factor, dimension: base.dimension },
    { si: Number(powered?.[2]), dimension: pure },
  ]);
}

function unitNamed(name: string): Unit | undefined {
  const key = name === 'inch' ? 'in' : name;
  return Object.hasOwn(units, key) ? units[key] : undefined;
}

function operate(fn: string, args: Measured[]): Measured {
  const [a, b] = args;
  if (!a) throw new ExpressionError('A number is missing.');
  if (!b) {
    if (fn === 'unaryMinus') return { si: -a.si, dimension: a.dimension };
    if (fn === 'unaryPlus') return a;
    throw new ExpressionError('Only + − × ÷ and ^ are read here.');
  }
  switch (fn) {
    case 'add':
    case 'subtract':
      if (!sameDimension(a.dimension, b.dimension)) {
        throw new ExpressionError('Only quantities of one kind can be added; give each its unit.');
      }
      return { si: fn === 'add' ? a.si + b.si : a.si - b.si, dimension: a.dimension };
    case 'multiply':
      return { si: a.si * b.si, dimension: combineDimensions(a.dimension, b.dimension, 1) };
    case 'divide':
      if (b.si === 0) throw new ExpressionError('This divides by zero.');
      return { si: a.si / b.si, dimension: combineDimensions(a.dimension, b.dimension, -1) };
    case 'pow':
      if (!sameDimension(b.dimension, pure) || !Number.isInteger(b.si) || Math.abs(b.si) > 6) {
        throw new ExpressionError('A power is a whole number up to 6.');
      }
      return { si: a.si ** b.si, dimension: combineDimensions(pure, a.dimension, b.si) };
    default:
      throw new ExpressionError('Only + − × ÷ and ^ are read here.');
  }
}
