import { TypesetError } from '@/lib/typeset/typeset-error';

export type Align = 'left' | 'centre' | 'right';

/** How a node is laid out, beyond standing in a row with its neighbours. */
export type Role =
  | 'row'
  | 'stack'
  | 'line'
  | 'stretch'
  | 'nothing'
  | 'rule'
  | 'separator'
  | 'null-delimiter'
  | 'lap';

/** What the classes of one node say: the same as dist/katex.css of katex 0.19.1 makes them mean in a browser. */
export type ClassMeaning = {
  readonly names: ReadonlySet<string>;
  readonly role: Role;
  readonly family?: string;
  readonly bold?: boolean;
  readonly italic?: boolean;
  /** Factor on the type size. */
  readonly scale: number;
  /** How rows of a stack below this node stand in its width. */
  readonly align?: Align;
  /** Margins and padding left and right, em. */
  readonly marginLeft: number;
  readonly marginRight: number;
  readonly padding: number;
  readonly zeroWidth: boolean;
};

type Style = Pick<ClassMeaning, 'family' | 'bold' | 'italic'>;

const STYLES: Readonly<Record<string, Style>> = {
  textrm: { family: 'Main' },
  textsf: { family: 'SansSerif' },
  texttt: { family: 'Typewriter' },
  textbf: { bold: true },
  textit: { italic: true },
  mathnormal: { family: 'Math', italic: true },
  mathit: { family: 'Main', italic: true },
  mathrm: { italic: false },
  mainrm: { family: 'Main', italic: false },
  mathbf: { family: 'Main', bold: true },
  boldsymbol: { family: 'Math', bold: true, italic: true },
  amsrm: { family: 'AMS' },
  mathbb: { family: 'AMS' },
  mathcal: { family: 'Caligraphic' },
  mathfrak: { family: 'Fraktur' },
  mathtt: { family: 'Typewriter' },
  mathscr: { family: 'Script' },
  mathsf: { family: 'SansSerif' },
  mathboldsf: { family: 'SansSerif', bold: true },
  'small-op': { family: 'Size1', italic: false },
  'large-op': { family: 'Size2', italic: false },
  'delim-size1': { family: 'Size1' },
  'delim-size4': { family: 'Size4' },
};

/** Type sizes 1 to 11 in em of the formula, katex.css `.katex-sizing`. */
const SIZES = [0, 0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.2, 1.44, 1.728, 2.074, 2.488];

const ROLES: readonly (readonly [Role, readonly string[]])[] = [
  ['stack', ['vlist-t']],
  ['line', ['frac-line', 'overline-line', 'underline-line', 'katex-hline', 'katex-hdashline']],
  ['stretch', ['hide-tail', 'katex-stretchy']],
  ['nothing', ['katex-strut', 'pstrut']],
  ['rule', ['katex-rule']],
  ['separator', ['vertical-separator']],
  ['null-delimiter', ['nulldelimiter']],
  ['lap', ['llap', 'rlap', 'clap']],
];

const ALIGNS: readonly (readonly [Align, readonly string[]])[] = [
  ['centre', ['mfrac', 'op-limits', 'katex-accent', 'col-align-c', 'mover', 'munder', 'x-arrow']],
  ['left', ['msupsub', 'col-align-l', 'svg-align']],
  ['right', ['col-align-r']],
];

/** Classes that change nothing here: atom kinds, and wrappers whose meaning lies in their parent. */
const NEUTRAL = new Set(
  `mord mbin mrel mopen mclose mpunct minner mop mspace mtight text sqrt mtable arraycolsep mult delimsizing
  delimsizinginner delimcenter op-symbol accent-body accent-full accentunder boxpad cancel-pad cancel-lap x-arrow-pad
  katex-root katex-overline katex-underline katex-smash katex-inner katex-fix katex-base katex-sizing fontsize-ensurer
  fbox leftmost brace-left brace-center brace-right halfarrow-left halfarrow-right overlay katex-overlay vlist-t2
  vlist-r vlist vlist-s nobreak katex-vbox katex-thinbox`.split(/\s+/),
);
const SIZE_CLASS = /^(reset-)?size(\d+)$/;

const meanings = new Map<string, ClassMeaning>();

/** The meaning of a node's classes. Throws a TypesetError on a class it does not know: better refused than misplaced. */
export function classMeaning(classes: readonly string[], tex: string): ClassMeaning {
  const key = classes.join(' ');
  let meaning = meanings.get(key);
  if (!meaning) {
    meaning = read(new Set(key.split(' ').filter(Boolean)), tex);
    meanings.set(key, meaning);
  }
  return meaning;
}

function read(names: ReadonlySet<string>, tex: string): ClassMeaning {
  const has = (list: readonly string[]) => list.some((name) => names.has(name));
  const role = ROLES.find(([, list]) => has(list))?.[0] ?? 'row';
  const align = ALIGNS.find(([, list]) => has(list))?.[0];
  let style: Style = {};
  for (const name of names) {
    if (STYLES[name]) style = { ...style, ...STYLES[name] };
    else if (!isKnown(name)) throw new TypesetError(`the construct "${name}"`, tex);
  }
  if (names.has('delimsizing')) {
    const size = ['1', '2', '3', '4'].find((digit) => names.has(`size${digit}`));
    if (size) style = { family: `Size${size}`, bold: false, italic: false };
  }
  const lap = names.has('cancel-lap') ? -0.2 : 0;
  const root = names.has('katex-root');
  return {
    names,
    role,
    ...style,
    scale: scaleOf(names),
    align,
    marginLeft: root ? 0.2777777778 : lap,
    marginRight: root ? -0.5555555556 : lap,
    padding: names.has('boxpad') ? 0.3 : names.has('cancel-pad') ? 0.2 : names.has('x-arrow-pad') ? 0.5 : 0,
    zeroWidth: names.has('katex-thinbox') || (names.has('accent-body') && !names.has('accent-full')),
  };
}

function isKnown(name: string): boolean {
  if (NEUTRAL.has(name) || SIZE_CLASS.test(name)) return true;
  return [...ROLES, ...ALIGNS].some(([, list]) => list.includes(name));
}

function scaleOf(names: ReadonlySet<string>): number {
  if (!names.has('katex-sizing') && !names.has('fontsize-ensurer')) return 1;
  let from = 6;
  let to = 6;
  for (const name of names) {
    const match = SIZE_CLASS.exec(name);
    if (match?.[1]) from = Number(match[2]);
    else if (match) to = Number(match[2]);
  }
  return (SIZES[to] ?? 1) / (SIZES[from] ?? 1);
}
