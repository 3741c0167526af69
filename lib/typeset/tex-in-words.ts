/** Commands that are one sign in running text. */
const SIGNS: Readonly<Record<string, string>> = {
  times: '×',
  cdot: '·',
  per: '·',
  div: '÷',
  pm: '±',
  mp: '∓',
  le: '≤',
  leq: '≤',
  ge: '≥',
  geq: '≥',
  ne: '≠',
  neq: '≠',
  approx: '≈',
  equiv: '≡',
  to: '→',
  rightarrow: '→',
  leftarrow: '←',
  Rightarrow: '⇒',
  uparrow: '↑',
  downarrow: '↓',
  infty: '∞',
  circ: '°',
  int: '∫',
  sum: 'Σ',
  prod: 'Π',
  therefore: '∴',
  colon: ':',
  ldots: '…',
  dots: '…',
  cdots: '…',
  EI: 'EI',
  EIo: 'EI_0',
  '%': '%',
  '{': '{',
  '}': '}',
  $: '$',
  '&': '&',
  '\\': '; ',
  alpha: 'α',
  beta: 'β',
  gamma: 'γ',
  delta: 'δ',
  varepsilon: 'ε',
  epsilon: 'ε',
  zeta: 'ζ',
  eta: 'η',
  theta: 'θ',
  vartheta: 'ϑ',
  iota: 'ι',
  kappa: 'κ',
  lambda: 'λ',
  mu: 'μ',
  nu: 'ν',
  xi: 'ξ',
  pi: 'π',
  rho: 'ρ',
  sigma: 'σ',
  tau: 'τ',
  upsilon: 'υ',
  varphi: 'φ',
  phi: 'φ',
  chi: 'χ',
  psi: 'ψ',
  omega: 'ω',
  Gamma: 'Γ',
  Delta: 'Δ',
  Theta: 'Θ',
  Lambda: 'Λ',
  Xi: 'Ξ',
  Pi: 'Π',
  Sigma: 'Σ',
  Phi: 'Φ',
  Psi: 'Ψ',
  Omega: 'Ω',
  ell: 'ℓ',
};
const SPACES = new Set([',', ';', ':', ' ', 'quad', 'qquad', 'enspace', 'thinspace']);
const NOTHING = new Set(['!', 'left', 'right', 'displaystyle', 'textstyle', 'limits', 'nolimits', 'hline']);
/** Accents as combining characters after their letter. */
const ACCENTS: Readonly<Record<string, string>> = {
  bar: '\u0304',
  overline: '\u0304',
  hat: '\u0302',
  tilde: '\u0303',
  vec: '\u20d7',
  dot: '\u0307',
  ddot: '\u0308',
};
const SUPERSCRIPTS: Readonly<Record<string, string>> = {
  '-': '⁻',
  0: '⁰',
  1: '¹',
  2: '²',
  3: '³',
  4: '⁴',
  5: '⁵',
  6: '⁶',
  7: '⁷',
  8: '⁸',
  9: '⁹',
};

/**
 * TeX in a line of plain characters, for search, copying and readers who do not see the page:
 * "EI_0 f_11 = 7.20/(3 × 2) = 1.200 m". A reading aid; the formula itself stays the authority.
 */
export function texInWords(tex: string): string {
  const reader = new Reader(tex.match(/\\[a-zA-Z]+|\\.|[^\\]/gsu) ?? []);
  return reader
    .until('')
    .replace(/ *; *$/g, '')
    .replace(/ {2,}/g, ' ')
    .trim();
}

/** A sign between two terms, as against one before a number. */
const SUM = /^[-+]$/;
const TERM = /[\p{L}\p{M}\p{N})\]°²³]\s*$/u;

class Reader {
  private at = 0;
  constructor(private readonly tokens: readonly string[]) {}

  /** Everything up to a closing token, which is taken too. */
  until(end: string): string {
    let words = '';
    for (let token = this.next(); token !== undefined && token !== end; token = this.next())
      words += SUM.test(token) && TERM.test(words) ? ` ${this.word(token)} ` : this.word(token);
    return words;
  }

  private next(): string | undefined {
    return this.tokens[this.at++];
  }

  private argument(): string {
    let token = this.next();
    while (token === ' ') token = this.next();
    if (token === undefined) return '';
    return token === '{' ? this.until('}') : this.word(token);
  }

  private word(token: string): string {
    if (token === '{') return this.until('}');
    if (token === '_') return `_${this.argument()}`;
    if (token === '^') return superscript(this.argument());
    if (token === '-') return '−';
    if (token === '=' || token === '<' || token === '>') return ` ${token} `;
    if (token === '&' || token === '~') return ' ';
    if (!token.startsWith('\\')) return token;
    // TeX drops the space that ends a command's name.
    if (/^\\[a-zA-Z]/.test(token)) while (this.tokens[this.at] === ' ') this.at++;
    return this.command(token.slice(1));
  }

  private command(name: string): string {
    const sign = SIGNS[name];
    if (sign !== undefined) return /[×≤≥≠≈≡→⇒±]/.test(sign) ? ` ${sign} ` : sign;
    if (SPACES.has(name)) return ' ';
    if (NOTHING.has(name)) return '';
    const accent = ACCENTS[name];
    if (accent !== undefined) return `${this.argument()}${accent}`;
    switch (name) {
      case 'frac':
      case 'tfrac':
      case 'dfrac':
        return `${enclosed(this.argument())}/${enclosed(this.argument())}`;
      case 'sqrt':
        return `√(${this.argument()})`;
      case 'unit':
        return ` ${this.argument()}`;
      case 'qty':
        return `${this.argument()} ${this.argument()}`;
      case 'dd':
        return ` d${this.argument()}`;
      case 'begin':
      case 'end':
        return bracket(name, this.argument());
      case 'textcolor':
        this.argument();
        return this.argument();
      default:
        return this.tokens[this.at] === '{' ? this.argument() : name;
    }
  }
}

function superscript(text: string): string {
  const signs = [...text].map((sign) => SUPERSCRIPTS[sign === '−' ? '-' : sign]);
  return signs.every((sign) => sign !== undefined) ? signs.join('') : `^${text}`;
}

/** In parentheses, unless it is one symbol or number. */
function enclosed(text: string): string {
  const own = text.replace(/ {2,}/g, ' ').trim();
  return /^[\p{L}\p{M}\p{N}_.⁰¹²³⁴-⁹]*$/u.test(own) ? own : `(${own})`;
}

function bracket(name: string, environment: string): string {
  if (environment === 'bmatrix') return name === 'begin' ? '[' : ']';
  if (environment === 'pmatrix') return name === 'begin' ? '(' : ')';
  return '';
}
