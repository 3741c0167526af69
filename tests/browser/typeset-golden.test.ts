import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import katex from 'katex';
import { type Browser, chromium } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { GlyphMark, Laid } from '@/lib/typeset/laid';
import { layOutTex } from '@/lib/typeset/lay-out-tex';
import { MACROS } from '@/lib/typeset/macros';
import { faces } from '../typeset/faces';
import { FORMULAS } from '../typeset/formulas';

/** Greatest distance, in em, between a glyph on paper and the same glyph in the browser. */
const NEAR = 0.01;
/** The index of a root: the browser rounds its negative margin. */
const NEAR_ROOT = 0.035;
/** Type size in CSS pixels; large, so that its rounding and least widths of 1 px fall below the tolerance. */
const PX = 200;

const dist = fileURLToPath(new URL('../../node_modules/katex/dist/', import.meta.url));

/** A character as the browser shows it: left edge from the formula's start, top edge from its baseline, height; em. */
type Seen = { text: string; x: number; top: number; height: number };

describe('formulas on paper stand as the browser shows them', () => {
  let browser: Browser;
  let seen: Seen[][] = [];

  beforeAll(async () => {
    browser = await chromium.launch({
      executablePath: '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-background-networking',
        '--disable-component-update',
      ],
    });
    const page = await browser.newPage();
    await page.setContent(htmlOfAll());
    await page.evaluate('document.fonts.ready');
    seen = await page.evaluate(readCharacters, PX);
  });
  afterAll(() => browser.close());

  it.each(FORMULAS.map(([tex, display], index) => ({ tex, display, index })))(
    '$tex',
    ({ tex, display, index }) => {
      const placed = characters(layOutTex(tex, display, faces));
      const shown = seen[index] ?? [];
      expect(placed.map((glyph) => glyph.text).join('')).toBe(shown.map((glyph) => glyph.text).join(''));
      const near = tex.includes('\\sqrt[') ? NEAR_ROOT : NEAR;
      placed.forEach((glyph, at) => {
        const other = shown[at];
        if (!other) throw new Error('the browser shows fewer characters');
        const baseline = -other.top - other.height * glyph.ascentShare;
        expect(Math.abs(glyph.x - other.x), `x of ${glyph.text}`).toBeLessThan(near);
        expect(Math.abs(glyph.y - baseline), `y of ${glyph.text}`).toBeLessThan(near);
      });
    },
  );
});

function characters(laid: Laid) {
  return laid.marks
    .filter((mark): mark is GlyphMark => mark.kind === 'glyphs')
    .flatMap(({ face, glyphs, advances, size, x, y }) => {
      let at = x;
      return glyphs.map((glyph, index) => {
        const placed = {
          text: String.fromCodePoint(...glyph.codePoints),
          x: at,
          y,
          ascentShare: face.ascent / (face.ascent + face.descent),
        };
        at += (advances[index] ?? 0) * size;
        return placed;
      });
    });
}

function htmlOfAll(): string {
  const css = readFileSync(`${dist}katex.css`, 'utf8').replace(
    /url\(fonts\/([^)]+\.woff2)\)/g,
    (_, file: string) => {
      return `url(data:font/woff2;base64,${readFileSync(`${dist}fonts/${file}`).toString('base64')})`;
    },
  );
  const formulas = FORMULAS.map(([tex, displayMode]) => {
    const html = katex.renderToString(tex, {
      displayMode,
      macros: { ...MACROS },
      output: 'html',
      strict: false,
    });
    return `<div class="f">${html}</div>`;
  });
  const layout = `body{margin:0}.f{white-space:nowrap;width:200000px}.katex{font-size:${PX}px!important}
    .katex-display,.katex-display>.katex{text-align:left!important}`;
  return `<!doctype html><meta charset="utf8"><style>${css}${layout}</style>${formulas.join('\n')}`;
}

/** Runs in the browser. */
function readCharacters(px: number): Seen[][] {
  return [...document.querySelectorAll('.f')].map((formula) => {
    const strut = formula.querySelector<HTMLElement>('.katex-strut');
    if (!strut) return [];
    const box = strut.getBoundingClientRect();
    const baseline = box.bottom + Number.parseFloat(strut.style.verticalAlign || '0') * px;
    const characters: Seen[] = [];
    const walker = document.createTreeWalker(formula, NodeFilter.SHOW_TEXT);
    for (let node = walker.nextNode(); node; node = walker.nextNode()) {
      const text = node.textContent ?? '';
      for (let at = 0; at < text.length; at++) {
        if (text.charCodeAt(at) === 0x200b || text[at] === '\n') continue;
        const range = document.createRange();
        range.setStart(node, at);
        range.setEnd(node, at + 1);
        const { left, top, height } = range.getBoundingClientRect();
        characters.push({
          text: text[at] ?? '',
          x: (left - box.left) / px,
          top: (top - baseline) / px,
          height: height / px,
        });
      }
    }
    return characters;
  });
}
