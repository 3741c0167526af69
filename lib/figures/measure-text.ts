/** Extent of a label in points: width, reach above and below its baseline. */
export interface TextBox {
  width: number;
  height: number;
  depth: number;
}

/** Measures rich text (`$TeX$` for mathematics) at a size in points. */
export type Measure = (text: string, size: number) => TextBox;

/** Widths in em of KaTeX_Main-Regular, from the font's own table, rounded up. */
const narrow: Record<string, number> = {
  '.': 0.28,
  ',': 0.28,
  ':': 0.28,
  ';': 0.28,
  ' ': 0,
  i: 0.35,
  j: 0.42,
  l: 0.3,
  t: 0.4,
  f: 0.5,
  r: 0.46,
  s: 0.47,
  m: 0.88,
  w: 0.73,
  M: 1.0,
  W: 1.0,
  I: 0.51,
  '(': 0.39,
  ')': 0.39,
  '/': 0.5,
  '+': 0.78,
  '-': 0.78,
  '−': 0.78,
  '=': 1.34,
  "'": 0.28,
};
const commands: Record<string, number> = {
  ',': 0.17,
  ';': 0.28,
  ':': 0.23,
  ' ': 0.25,
  quad: 1,
  cdot: 0.28,
  per: 0.28,
  times: 1.23,
  Delta: 0.84,
  Sigma: 0.73,
  circ: 0.5,
};
const wide = new Set(['bar', 'hat', 'mathrm', 'mathit', 'mathbf', 'text', 'unit', 'vec']);

/**
 * An estimate for where no type is at hand: widths of KaTeX's roman letters, scripts at 0.7, every letter of running
 * text 0.58 em (the mean of Inter over English text, rounded up). Meant to err on the wide side.
 */
export function estimateText(text: string, size: number): TextBox {
  let width = 0;
  text.split(/(?<!\\)\$/).forEach((part, i) => {
    width += i % 2 === 0 ? part.length * 0.58 : estimateTex(part);
  });
  return { width: width * size, height: 0.72 * size, depth: 0.22 * size };
}

function estimateTex(tex: string): number {
  const tokens = tex.match(/\\[a-zA-Z]+|\\.|[^\\]/gu) ?? [];
  let at = 0;
  /** Width of one argument: a group in braces or a single token. */
  const argument = (): number => {
    const token = tokens[at++];
    if (token === undefined) return 0;
    if (token !== '{') return one(token);
    let sum = 0;
    while (at < tokens.length && tokens[at] !== '}') sum += term();
    at++;
    return sum;
  };
  const one = (token: string): number => {
    if (!token.startsWith('\\')) return narrow[token] ?? (/[A-Z]/.test(token) ? 0.79 : 0.56);
    const name = token.slice(1);
    if (name === 'unit') return 0.17 + argument();
    if (name === 'qty') return argument() + 0.17 + argument();
    if (name === 'tfrac' || name === 'frac') return 0.75 * Math.max(argument(), argument()) + 0.25;
    return wide.has(name) ? argument() : (commands[name] ?? 0.65);
  };
  const term = (): number => {
    const token = tokens[at];
    if (token === '{') return argument();
    at++;
    if (token !== '_' && token !== '^') return one(token ?? '');
    const first = argument();
    const next = tokens[at];
    if (next !== '_' && next !== '^') return 0.7 * first + 0.05;
    at++;
    return 0.7 * Math.max(first, argument()) + 0.05;
  };
  let sum = 0;
  while (at < tokens.length) sum += term();
  return sum;
}
