import katex from 'katex';
import { createElement, type ReactNode } from 'react';
import { MACROS } from '@/lib/typeset/macros';

const kept = new Map<string, ReactNode>();
const most = 4_000;

/**
 * TeX as KaTeX shows it, MathML for readers beside HTML for the eye, as React elements. KaTeX is told to trust
 * nothing; what it cannot set is shown as it was written. Results are kept, since a sheet repeats its symbols.
 */
export function renderTex(tex: string, display = false): ReactNode {
  const key = `${display ? 'd' : 'i'}${tex}`;
  const known = kept.get(key);
  if (known !== undefined) return known;
  const markup = katex.renderToString(tex, {
    displayMode: display,
    output: 'htmlAndMathml',
    macros: { ...MACROS },
    throwOnError: false,
    strict: false,
    trust: false,
  });
  const element = readMarkup(markup);
  if (kept.size >= most) kept.delete(kept.keys().next().value as string);
  kept.set(key, element);
  return element;
}

interface Open {
  tag: string;
  attributes: Record<string, unknown>;
  children: ReactNode[];
}

/** KaTeX writes well-formed XML; its tags become elements one for one, so no markup is ever inserted as text. */
function readMarkup(markup: string): ReactNode {
  const root: Open = { tag: '', attributes: {}, children: [] };
  const open: Open[] = [root];
  for (const [, close, tag, attributes = '', empty, text] of markup.matchAll(
    /<(\/?)([a-zA-Z]+)((?:\s+[\w:-]+="[^"]*"|\s+[\w:-]+='[^']*')*)\s*(\/?)>|([^<]+)/g,
  )) {
    const parent = open.at(-1) ?? root;
    if (text !== undefined) parent.children.push(unescapeText(text));
    else if (close) {
      open.pop();
      (open.at(-1) ?? root).children.push(elementOf(parent));
    } else if (tag) {
      const node = { tag, attributes: readAttributes(attributes), children: [] };
      if (empty) parent.children.push(elementOf(node));
      else open.push(node);
    }
  }
  return root.children.length === 1 ? root.children[0] : createElement('span', null, ...root.children);
}

function elementOf({ tag, attributes, children }: Open): ReactNode {
  return createElement(tag, attributes, ...children);
}

function readAttributes(text: string): Record<string, unknown> {
  const props: Record<string, unknown> = {};
  for (const [, name = '', double, single] of text.matchAll(/([\w:-]+)=(?:"([^"]*)"|'([^']*)')/g)) {
    const value = unescapeText(double ?? single ?? '');
    if (name === 'class') props.className = value;
    else if (name === 'style') props.style = readStyle(value);
    else props[name.startsWith('aria-') || name.startsWith('data-') ? name : camelCase(name)] = value;
  }
  return props;
}

function readStyle(text: string): Record<string, string> {
  const style: Record<string, string> = {};
  for (const declaration of text.split(';')) {
    const colon = declaration.indexOf(':');
    if (colon > 0) style[camelCase(declaration.slice(0, colon).trim())] = declaration.slice(colon + 1).trim();
  }
  return style;
}

const camelCase = (name: string): string =>
  name.replace(/-([a-z])/g, (_, letter: string) => letter.toUpperCase());

const entities: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"', '#x27': "'", '#39': "'" };

const unescapeText = (text: string): string =>
  text.replace(/&([a-z]+|#x?[0-9a-f]+);/gi, (whole, name: string) => entities[name.toLowerCase()] ?? whole);
