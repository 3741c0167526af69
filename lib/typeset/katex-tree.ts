import katex from 'katex';
import { MACROS } from '@/lib/typeset/macros';
import { TypesetError } from '@/lib/typeset/typeset-error';

/**
 * A node of the box tree from which KaTeX writes its HTML (katex 0.19.1, src/domTree). Lengths in `style` are in em;
 * a node with `text` is a symbol, one with `attributes` a picture or a part of one.
 */
export type KatexNode = {
  readonly classes?: readonly string[];
  readonly children?: readonly KatexNode[];
  readonly style?: Readonly<Record<string, string | undefined>>;
  readonly height?: number;
  readonly depth?: number;
  readonly text?: string;
  readonly italic?: number;
  readonly attributes?: Readonly<Record<string, string | undefined>>;
  readonly pathName?: string;
  readonly alternate?: string;
  toMarkup(): string;
};

type TreeBuilder = {
  __renderToHTMLTree(tex: string, options: katex.KatexOptions): KatexNode;
};

/** The unbreakable pieces of a formula, in order; KaTeX may break a line between them. */
export function katexBases(tex: string, display: boolean): KatexNode[] {
  const bases: KatexNode[] = [];
  const visit = (node: KatexNode) => {
    if (node.classes?.includes('katex-tag')) throw new TypesetError('\\tag', tex);
    if (node.classes?.includes('katex-newline'))
      throw new TypesetError('a line break outside an environment', tex);
    if (node.classes?.includes('katex-base')) bases.push(node);
    else node.children?.forEach(visit);
  };
  visit(parse(tex, display));
  return bases;
}

function parse(tex: string, display: boolean): KatexNode {
  try {
    // The tree builder is exported by KaTeX but left out of its types; the pinned version keeps it stable.
    return (katex as unknown as TreeBuilder).__renderToHTMLTree(tex, {
      displayMode: display,
      macros: { ...MACROS },
      throwOnError: true,
      strict: false,
    });
  } catch (cause) {
    throw new TypesetError(cause instanceof Error ? cause.message : 'the formula', tex, { cause });
  }
}

/** A style length in em as a number; an absent one is nought. */
export function em(length: string | undefined): number {
  return length === undefined ? 0 : Number.parseFloat(length);
}
