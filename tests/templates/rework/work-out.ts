import type { Node } from './parse-tex';

/** Exponents of force, length and temperature. Undefined: a zero, which has any unit. */
export type Unit = readonly [number, number, number] | undefined;

export interface Worked {
  value: number;
  unit: Unit;
}

/** What a symbol stands for; undefined when it is not known. */
export type Lookup = (name: string) => Worked | undefined;

const base: Record<string, { factor: number; unit: readonly [number, number, number] }> = {
  kip: { factor: 1, unit: [1, 0, 0] },
  kN: { factor: 1, unit: [1, 0, 0] },
  ft: { factor: 1, unit: [0, 1, 0] },
  m: { factor: 1, unit: [0, 1, 0] },
  in: { factor: 1 / 12, unit: [0, 1, 0] },
  mm: { factor: 1 / 1000, unit: [0, 1, 0] },
  '{}^\\circ F': { factor: 1, unit: [0, 0, 1] },
  K: { factor: 1, unit: [0, 0, 1] },
  rad: { factor: 1, unit: [0, 0, 0] },
  '1': { factor: 1, unit: [0, 0, 0] },
};

/** Reads a unit as it is printed: `kip\per ft^2`, `kN/m`, `/(kN\per m)`. */
export function readUnit(text: string): { factor: number; unit: readonly [number, number, number] } {
  const [above = '', below = ''] = text.replace(/^\\mathrm\{(.*)\}$/, '$1').split('/');
  let factor = 1;
  const unit: [number, number, number] = [0, 0, 0];
  const take = (part: string, sign: 1 | -1) => {
    for (const piece of part.replace(/[()]/g, '').split('\\per ')) {
      if (piece === '') continue;
      const match = /^(.*?)(?:\^\{?(\d)\}?)?$/.exec(piece.startsWith('{}') ? piece : piece.trim());
      const known = base[match?.[1] ?? ''];
      if (!known) throw new Error(`no such unit: ${piece}`);
      const power = sign * Number(match?.[2] ?? 1);
      factor *= known.factor ** power;
      known.unit.forEach((e, i) => {
        unit[i] = (unit[i] ?? 0) + power * e;
      });
    }
  };
  take(above, 1);
  take(below, -1);
  return { factor, unit };
}

export class UnitsDiffer extends Error {}
export class Unknown extends Error {}

/** Works a formula with units. Throws where terms of a sum differ in unit or a symbol is not known. */
export function workOut(node: Node, lookup: Lookup = () => undefined): Worked {
  const of = (n: Node) => workOut(n, lookup);
  switch (node.kind) {
    case 'number': {
      const { factor, unit } = readUnit(node.unit);
      return { value: node.value * factor, unit: node.value === 0 && node.unit === '' ? undefined : unit };
    }
    case 'symbol': {
      const found = lookup(node.name);
      if (!found) throw new Unknown(node.name);
      return found;
    }
    case 'sum': {
      const terms = node.of.map(of);
      const unit = terms.reduce<Unit>((u, t) => same(u, t.unit), undefined);
      return { value: terms.reduce((s, t) => s + t.value, 0), unit };
    }
    case 'product': {
      const factors = node.of.map(of);
      const unit = factors.reduce<Unit>((u, f) => combine(u, f.unit, 1), [0, 0, 0]);
      return { value: factors.reduce((p, f) => p * f.value, 1), unit };
    }
    case 'negative': {
      const x = of(node.of);
      return { value: -x.value, unit: x.unit };
    }
    case 'quotient': {
      const [over, under] = [of(node.over), of(node.under)];
      return { value: over.value / under.value, unit: combine(over.unit, under.unit, -1) };
    }
    case 'power': {
      const x = of(node.base);
      return { value: x.value ** node.exponent, unit: x.unit && scaled(x.unit, node.exponent) };
    }
    case 'root': {
      const x = of(node.of);
      return { value: Math.sqrt(x.value), unit: x.unit && scaled(x.unit, 0.5) };
    }
  }
}

const scaled = (u: NonNullable<Unit>, by: number): Unit => [u[0] * by, u[1] * by, u[2] * by];

function combine(a: Unit, b: Unit, sign: 1 | -1): Unit {
  return a && b ? [a[0] + sign * b[0], a[1] + sign * b[1], a[2] + sign * b[2]] : undefined;
}

/** The common unit of two quantities. */
export function same(a: Unit, b: Unit): Unit {
  if (!a || !b) return a ?? b;
  if (a.some((e, i) => Math.abs(e - (b[i] ?? 0)) > 1e-9))
    throw new UnitsDiffer(`${a.join()} and ${b.join()}`);
  return a;
}

/** Half a unit of the last figure of every number, times what it moves the result. */
export function roundingOf(node: Node, lookup: Lookup): number {
  const numbers: Extract<Node, { kind: 'number' }>[] = [];
  const collect = (n: Node): void => {
    if (n.kind === 'number') numbers.push(n);
    else if (n.kind === 'sum' || n.kind === 'product') n.of.forEach(collect);
    else if (n.kind === 'negative' || n.kind === 'root') collect(n.of);
    else if (n.kind === 'quotient') [n.over, n.under].forEach(collect);
    else if (n.kind === 'power') collect(n.base);
  };
  collect(node);
  const plain = workOut(node, lookup).value;
  return numbers.reduce((total, n) => {
    if (n.decimals === 0 && n.unit === '') return total;
    const before = n.value;
    n.value = before + 0.5 * 10 ** -n.decimals;
    const moved = Math.abs(workOut(node, lookup).value - plain);
    n.value = before;
    return total + moved;
  }, 0);
}

export function symbolsIn(node: Node): string[] {
  switch (node.kind) {
    case 'number':
      return [];
    case 'symbol':
      return [node.name];
    case 'sum':
    case 'product':
      return node.of.flatMap(symbolsIn);
    case 'negative':
    case 'root':
      return symbolsIn(node.of);
    case 'quotient':
      return [...symbolsIn(node.over), ...symbolsIn(node.under)];
    case 'power':
      return symbolsIn(node.base);
  }
}

/** A unit of the last figure, in coherent units, of a member that is one printed number (perhaps negative). */
export function lastFigure(node: Node): number | undefined {
  if (node.kind === 'negative') return lastFigure(node.of);
  return node.kind === 'number' ? 10 ** -node.decimals * readUnit(node.unit).factor : undefined;
}
