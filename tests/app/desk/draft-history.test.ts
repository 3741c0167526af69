import { describe, expect, it } from 'vitest';
import { changeDraft, type DraftHistory } from '@/app/jobs/[job]/sheets/[sheet]/_desk/draft-history';
import type { Column } from '@/app/jobs/[job]/sheets/[sheet]/_desk/table/column';
import { fillDown, pasteBlock, readBlock } from '@/app/jobs/[job]/sheets/[sheet]/_desk/table/paste-block';
import { writeAtPath } from '@/app/jobs/[job]/sheets/[sheet]/_desk/write-at-path';
import { startingDraft } from '@/lib/model/starting-draft';

const start = (): DraftHistory => ({ past: [], present: startingDraft('beam', 'SI', 'One'), future: [] });
const title = (h: DraftHistory, text: string, at: number, path = 'title') =>
  changeDraft(h, { type: 'edit', path, at, apply: (d) => writeAtPath(d, 'title', text) });

describe('the history of a draft', () => {
  it('takes quick typing in one field as one step', () => {
    let h = title(start(), 'T', 0);
    h = title(h, 'Tw', 200);
    h = title(h, 'Two', 400);
    h = changeDraft(h, { type: 'undo' });
    expect(h.present.title).toBe('One');
    expect(changeDraft(h, { type: 'redo' }).present.title).toBe('Two');
  });

  it('takes two fields, or one field after a pause, as two steps', () => {
    let h = title(start(), 'Two', 0);
    h = title(h, 'Three', 5_000);
    h = changeDraft(h, { type: 'undo' });
    expect(h.present.title).toBe('Two');
    h = title(title(start(), 'Two', 0, 'a'), 'Three', 100, 'b');
    expect(changeDraft(h, { type: 'undo' }).present.title).toBe('Two');
  });

  it('forgets what was undone when something new is typed', () => {
    let h = changeDraft(title(start(), 'Two', 0), { type: 'undo' });
    h = title(h, 'Three', 9_000);
    expect(changeDraft(h, { type: 'redo' })).toBe(h);
  });

  it('stays where it is when there is nothing to undo', () => {
    const h = start();
    expect(changeDraft(h, { type: 'undo' })).toBe(h);
  });
});

describe('writing at a path', () => {
  it('copies what lies on the way and nothing beside it', () => {
    const before = { a: [{ x: 1 }, { x: 2 }], b: { y: 3 } };
    const after = writeAtPath(before, 'a.1.x', 5);
    expect(after).toEqual({ a: [{ x: 1 }, { x: 5 }], b: { y: 3 } });
    expect(after.b).toBe(before.b);
    expect(after.a[0]).toBe(before.a[0]);
  });

  it('says so when there is no such place', () => {
    expect(() => writeAtPath({ a: 1 }, 'a.b.c', 2)).toThrow('nothing to write');
  });
});

type Row = { name: string; kind: string };
const columns: Column<Row>[] = [
  {
    key: 'name',
    head: 'Name',
    width: '',
    field: 'name',
    read: (r) => r.name,
    write: (r, name) => ({ ...r, name }),
  },
  {
    key: 'kind',
    head: 'Kind',
    width: '',
    field: 'kind',
    options: [{ value: 'p', label: 'pinned' }],
    read: (r) => r.kind,
    write: (r, kind) => ({ ...r, kind }),
  },
];
const blank = () => ({ name: '', kind: '' });

describe('a pasted block', () => {
  it('is written from the corner on, making the rows it needs', () => {
    const block = readBlock('20 ft\tpinned\r\n18 ft\tp\r\n');
    expect(pasteBlock([{ name: 'x', kind: '' }], columns, { row: 0, column: 0 }, block, blank)).toEqual([
      { name: '20 ft', kind: 'p' },
      { name: '18 ft', kind: 'p' },
    ]);
  });

  it('leaves a choice alone that does not know the word, and cells beyond the last column', () => {
    const block = readBlock('a\tsliding\tmore');
    expect(pasteBlock([{ name: '', kind: 'p' }], columns, { row: 0, column: 0 }, block, blank)).toEqual([
      { name: 'a', kind: 'p' },
    ]);
  });

  it('makes no rows where rows are given', () => {
    expect(pasteBlock([blank()], columns, { row: 0, column: 0 }, [['a'], ['b']], undefined)).toHaveLength(1);
  });

  it('of two hundred rows is written in full', () => {
    const text = Array.from({ length: 200 }, (_, i) => `${i} m\tpinned`).join('\n');
    expect(pasteBlock([], columns, { row: 0, column: 0 }, readBlock(text), blank)).toHaveLength(200);
  });
});

describe('filling down', () => {
  it('repeats the cell above and touches nothing else', () => {
    const rows = [
      { name: 'a', kind: 'p' },
      { name: 'b', kind: '' },
    ];
    expect(fillDown(rows, columns[1] as Column<Row>, 1)[1]).toEqual({ name: 'b', kind: 'p' });
    expect(fillDown(rows, columns[0] as Column<Row>, 0)).toEqual(rows);
  });
});
