import { dimensions } from './dimensions';
import type { Value } from './expression';

/** Arms without a name in the drawing get one as they are met: e_1, e_2 …, each with one meaning on the sheet. */
export class ArmNames {
  private readonly known: Value[] = [];

  constructor(private readonly decimals: number) {}

  get count(): number {
    return this.known.length;
  }

  since(count: number): Value[] {
    return this.known.slice(count);
  }

  add(size: number): Value {
    const same = this.known.find((a) => Math.abs(a.value - size) <= 1e-9 * size);
    if (same) return same;
    const symbol = { letter: 'e', sub: [`${this.known.length + 1}`] };
    const { decimals } = this;
    const value: Value = { kind: 'value', symbol, value: size, dimension: dimensions.length, decimals };
    this.known.push(value);
    return value;
  }
}
