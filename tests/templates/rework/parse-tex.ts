/** What a formula of a calculation says, read from its TeX alone. */
export type Node =
  | { kind: 'number'; value: number; decimals: number; unit: string }
  | { kind: 'symbol'; name: string }
  | { kind: 'sum' | 'product'; of: Node[] }
  | { kind: 'negative' | 'root'; of: Node }
  | { kind: 'quotient'; over: Node; under: Node }
  | { kind: 'power'; base: Node; exponent: number };

/** Letters that EI_0 joins to one symbol: EI_0 δ_10, EI_0 f_11. */
const joined = /^EI_0\\,\s*(?=f_|\\delta|\\Delta_\{\d|v_|\\theta)/;

/** Reads an expression: numbers with units, symbols, + − × /, fractions, roots, powers, brackets. Throws on anything else. */
export function parseTex(tex: string): Node {
  const reader = new Reader(tex.replaceAll('\\text{–}', '–'));
  const node = reader.sum();
  reader.space();
  if (!reader.ended) throw new Error(`not read: ${reader.rest}`);
  return node;
}

class Reader {
  private at = 0;

  constructor(private readonly tex: string) {}

  get rest(): string {
    return this.tex.slice(this.at);
  }

  get ended(): boolean {
    return this.at >= this.tex.length;
  }

  space(): void {
    const found = /^(?:\s|\\;|\\quad|\\displaystyle|\\textstyle(?!\\sum))+/.exec(this.rest);
    if (found) this.at += found[0].length;
  }

  take(pattern: RegExp): RegExpExecArray | undefined {
    this.space();
    const found = pattern.exec(this.rest);
    if (found?.index !== 0) return undefined;
    this.at += found[0].length;
    return found;
  }

  sum(): Node {
    const terms: Node[] = [];
    let sign = this.take(/^[-+]/)?.[0] ?? '+';
    for (;;) {
      const term = this.product();
      terms.push(sign === '-' ? { kind: 'negative', of: term } : term);
      const next = this.take(/^[-+]/)?.[0];
      if (!next) break;
      sign = next;
    }
    const [only] = terms;
    return terms.length === 1 && only ? only : { kind: 'sum', of: terms };
  }

  product(): Node {
    const factors = [this.power()];
    for (;;) {
      if (this.take(/^\//)) {
        const under = this.power();
        const over: Node =
          factors.length === 1 && factors[0] ? factors[0] : { kind: 'product', of: [...factors] };
        factors.splice(0, factors.length, { kind: 'quotient', over, under });
        continue;
      }
      this.take(/^(\\times|\\,)/);
      this.space();
      if (this.ended || /^([-+=)}]|\\right|\\le(?![a-z]))/.test(this.rest)) break;
      factors.push(this.power());
    }
    const [only] = factors;
    return factors.length === 1 && only ? only : { kind: 'product', of: factors };
  }

  power(): Node {
    const base = this.atom();
    const raised = this.take(/^\^\{?(\d)\}?/);
    return raised ? { kind: 'power', base, exponent: Number(raised[1]) } : base;
  }

  atom(): Node {
    this.space();
    const number = this.take(/^\d(?:\d|\{,\}(?=\d{3})|\\,(?=\d{3}(?!\d)))*(?:\.\d+)?/);
    if (number) return this.quantity(number[0]);
    if (this.take(/^\\[dt]?frac/)) return { kind: 'quotient', over: this.group(), under: this.group() };
    if (this.take(/^\\sqrt/)) return { kind: 'root', of: this.group() };
    if (this.take(/^(\\left)?\(/)) {
      const inner = this.sum();
      if (!this.take(/^(\\right)?\)/)) throw new Error(`no closing bracket: ${this.rest}`);
      return inner;
    }
    if (this.take(/^\\left\|/)) {
      const inner = this.sum();
      if (!this.take(/^\\right\|/)) throw new Error(`no closing bar: ${this.rest}`);
      return inner;
    }
    return this.symbol();
  }

  private quantity(text: string): Node {
    const plain = text.replaceAll('{,}', '').replaceAll('\\,', '');
    const decimals = plain.split('.')[1]?.length ?? 0;
    const unit = this.take(/^\\unit\{/) ? this.until('}') : '';
    return { kind: 'number', value: Number(plain), decimals, unit };
  }

  private symbol(): Node {
    const lead = this.take(joined)?.[0] ?? '';
    const found = this.take(
      /^(?:\\(?:bar|hat)\{[^{}]*\}|\\(?:cos|sin)\\alpha|\\Delta T|EI_0|EA|GA|EI|\\mathrm\{[^{}]*\}|\\[A-Za-z]+|[A-Za-z])/,
    );
    if (!found) throw new Error(`no symbol: ${this.rest}`);
    let name = found[0];
    if (/^\\(times|frac|sum|int|text|right|left|le|unit|quad)$/.test(name))
      throw new Error(`not an atom: ${name}`);
    if (name !== 'EI_0') name += this.scripts();
    return { kind: 'symbol', name: `${lead.replace(/\s/g, '')}${name}` };
  }

  private scripts(): string {
    let text = '';
    for (;;) {
      const found = /^(_|\^)/.exec(this.rest);
      if (!found) return text;
      const after = this.rest.slice(1);
      // A bare figure above is a power, anything else a name.
      if (found[0] === '^' && /^\{?\d\}?(?!\w)/.test(after)) return text;
      this.at += 1;
      if (after.startsWith('{')) {
        this.at += 1;
        text += `${found[0]}{${this.until('}')}}`;
      } else {
        this.at += 1;
        text += `${found[0]}{${after.charAt(0)}}`;
      }
    }
  }

  private group(): Node {
    if (!this.take(/^\{/)) throw new Error(`no group: ${this.rest}`);
    const node = this.sum();
    if (!this.take(/^\}/)) throw new Error(`group not closed: ${this.rest}`);
    return node;
  }

  /** Text up to the brace that closes the one just read. */
  private until(close: string): string {
    let depth = 1;
    const start = this.at;
    while (this.at < this.tex.length) {
      const c = this.tex[this.at];
      if (c === '{') depth += 1;
      if (c === close) depth -= 1;
      this.at += 1;
      if (depth === 0) return this.tex.slice(start, this.at - 1);
    }
    throw new Error(`not closed: ${this.tex.slice(start)}`);
  }
}
