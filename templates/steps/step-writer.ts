import type { Drawing } from '@/lib/figures/drawing';
import type { UnitSet } from '@/lib/model/analysis';
import type { Block, EquationRow, TableColumn, TableRow } from '../block';

/** What a table is made of; its number is that of its line. */
export interface TableInput {
  caption: string;
  columns: TableColumn[];
  rows: TableRow[];
  note?: string;
  source?: string;
}

/** What runs through the whole sheet: the count of its figures, and whether they are drawn for phones as well. */
export interface SheetCounters {
  figures: number;
  narrow: boolean;
}

/** Gathers the blocks of one step and numbers its lines: 5, 5.1, 5.2 … */
export class StepWriter {
  readonly blocks: Block[] = [];
  private line = 0;

  constructor(
    readonly number: number,
    readonly units: UnitSet,
    private readonly counters: SheetCounters,
  ) {}

  heading(text: string): void {
    this.blocks.push({ kind: 'heading', id: `${this.number}`, text });
  }

  /** The number the next line will have, for a sentence that points to it. */
  get next(): string {
    return `${this.number}.${this.line + 1}`;
  }

  paragraph(text: string, source?: string): void {
    this.blocks.push({ kind: 'paragraph', id: this.take(), text, source });
  }

  /** Lines of mathematics with the sentence that leads in. Nothing is written when there are none. */
  equations(text: string | undefined, rows: EquationRow[], source?: string): void {
    if (rows.length > 0) this.blocks.push({ kind: 'equations', id: this.take(), text, rows, source });
  }

  table({ caption, columns, rows, note, source }: TableInput): void {
    if (rows.length === 0) return;
    const id = this.take();
    this.blocks.push({
      kind: 'table',
      id,
      caption: `**Table ${id}.** ${caption}`,
      columns,
      rows,
      note,
      source,
    });
  }

  /** Drawings side by side; `narrow` lays the same out for the column of a phone, where the sheet has such. */
  figure(caption: string, drawings: Drawing[], narrow: () => Drawing[]): void {
    if (drawings.length === 0) return;
    this.counters.figures += 1;
    const numbered = `**Figure ${this.counters.figures}.** ${caption}`;
    this.blocks.push({
      kind: 'figure',
      id: this.take(),
      caption: numbered,
      drawings,
      narrow: this.counters.narrow ? narrow() : undefined,
    });
  }

  caution(text: string): void {
    this.blocks.push({ kind: 'caution', id: this.take(), text });
  }

  private take(): string {
    this.line += 1;
    return `${this.number}.${this.line}`;
  }
}
