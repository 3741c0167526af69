import type { Typesetter } from '@/lib/typeset/typesetter';
import type { Block } from '../block';
import type { Ink } from './ink';
import type { LineMarks } from './margin-note';
import { type PageGeometry, type PaperSize, pageGeometry } from './page-geometry';
import { PaperError } from './paper-error';
import { MM } from './paper-look';
import { placed, setBlock } from './set-block';
import { equalsColumn } from './set-equations';
import type { Strip } from './strip';

/** One page of a sheet: its ink at its place, and where its blocks and headings begin (points from the top). */
export type Page = {
  readonly ink: readonly Ink[];
  readonly anchors: readonly { readonly block: string; readonly y: number; readonly heading?: string }[];
};

export type PaginateOptions = {
  readonly size: PaperSize;
  /** Marks of checking and revision by the id of the line. */
  readonly marks?: Readonly<Record<string, LineMarks>>;
  /** Keep the margin's foot free for a seal on every page. */
  readonly sealed?: boolean;
  /** Height kept free at the margin's foot for the legend of marks, points. */
  readonly legend?: number;
};

/** A heading without this much after it goes to the next page. */
const AFTER_HEADING = 19 * MM;

/**
 * Sets a sheet's blocks and breaks them into pages. No heading is left alone at a foot, no row of a table, equation or
 * figure is split, and notes in the margin end above the seal. Throws a PaperError naming a block that fits no page.
 */
export function paginate(blocks: readonly Block[], options: PaginateOptions, typesetter: Typesetter): Page[] {
  const page = pageGeometry(options.size);
  const setting = { page, typesetter, column: equalsColumn(blocks, typesetter) };
  const flow = new Flow(page, options);
  for (const block of blocks) {
    const strips = setBlock(block, options.marks?.[block.id], setting);
    if (block.kind === 'heading') flow.add(strips, block.text);
    else flow.add(strips);
  }
  return flow.finish();
}

class Flow {
  private readonly pages: { ink: Ink[]; anchors: { block: string; y: number; heading?: string }[] }[] = [];
  private readonly waiting: { strip: Strip; heading?: string; first: boolean }[] = [];
  private section: Strip | undefined;
  private y: number;
  private fresh = true;
  private readonly noteLimit: number;

  constructor(
    private readonly page: PageGeometry,
    { sealed, legend = 0 }: PaginateOptions,
  ) {
    this.y = page.top;
    this.noteLimit = (sealed ? page.marginSeal.y - 2 * MM : page.bottom) - legend;
  }

  /** Takes in a block's strips; those kept together are placed once their last one is known. */
  add(strips: readonly Strip[], heading?: string): void {
    strips.forEach((strip, index) => {
      this.waiting.push({ strip, heading: index === 0 ? heading : undefined, first: index === 0 });
      if (!strip.keep) this.place();
    });
  }

  finish(): Page[] {
    this.place();
    return this.pages;
  }

  private place(): void {
    const group = this.waiting.splice(0);
    if (group.length === 0) return;
    if (this.fits(group.map(({ strip }) => strip))) {
      for (const item of group) this.put(item);
      return;
    }
    if (!this.fresh) {
      this.turn(group[0]?.strip);
      if (this.fits(group.map(({ strip }) => strip))) {
        for (const item of group) this.put(item);
        return;
      }
    }
    this.placeOneByOne(group);
  }

  /** What is kept together but fills more than a page is broken after all, yet never within a strip. */
  private placeOneByOne(group: { strip: Strip; heading?: string; first: boolean }[]): void {
    for (const item of group) {
      if (!this.fits([item.strip]) && !this.fresh) this.turn(item.strip);
      if (!this.fits([item.strip])) {
        throw new PaperError('does-not-fit', item.strip.block, 'It is taller than a page.');
      }
      this.put(item);
    }
  }

  private fits(strips: readonly Strip[]): boolean {
    let y = this.y;
    for (const [index, strip] of strips.entries()) {
      if (index > 0 || !this.fresh) y += strip.before;
      if (strip.noteHeight > 0 && y + strip.noteHeight > this.noteLimit) return false;
      y += strip.height;
    }
    const least = strips[0]?.again ? this.y + (this.fresh ? 0 : (strips[0]?.before ?? 0)) + AFTER_HEADING : 0;
    return Math.max(y, least) <= this.page.bottom + 0.01;
  }

  private put({ strip, heading, first }: { strip: Strip; heading?: string; first: boolean }): void {
    if (this.pages.length === 0) this.pages.push({ ink: [], anchors: [] });
    if (!this.fresh) this.y += strip.before;
    const page = this.pages.at(-1);
    page?.ink.push(...placed(strip, this.page, this.y));
    if (first) page?.anchors.push({ block: strip.block, y: this.y, heading });
    if (strip.again) this.section = strip.again;
    this.y += strip.height;
    this.fresh = false;
  }

  /** Begins a page; what goes on from the last one says so. */
  private turn(next: Strip | undefined): void {
    this.pages.push({ ink: [], anchors: [] });
    this.y = this.page.top;
    this.fresh = true;
    const heads = next?.again ? [] : [this.section, next?.head].filter((head) => head !== undefined);
    for (const head of heads) {
      this.pages.at(-1)?.ink.push(...placed(head, this.page, this.y));
      this.y += head.height;
    }
  }
}
