'use client';

import { useState } from 'react';
import type { FormState } from '@/app/components/form-state';
import { LinePicker } from '@/app/components/line-picker';
import { ReadingPage } from '@/app/components/reading-page';
import type { Block } from '@/templates/block';
import { SheetView } from '@/templates/screen/sheet-view';
import { ConcludeForm } from './conclude-form';
import { LineMark } from './line-mark';
import { MarkForm } from './mark-form';
import { MarkList } from './mark-list';
import { useCheckKeys } from './use-check-keys';

export interface CheckMark {
  id: string;
  line: string;
  kind: 'agrees' | 'correct' | 'query';
  text: string;
  answer: string | null;
}

export type MarkDraft = Pick<CheckMark, 'kind' | 'text'>;

export type FormAction = (state: FormState, form: FormData) => Promise<FormState>;

interface Props {
  title: string;
  blocks: Block[];
  check: { state: 'open' | 'agreed' | 'returned' | 'void'; mine: boolean; checker: string; note: string };
  marks: CheckMark[];
  onMark: FormAction;
  onConclude: FormAction;
  onAnswer: (markId: string, state: FormState, form: FormData) => Promise<FormState>;
  mayAnswer: boolean;
}

const noMark = { kind: 'agrees', text: '' } as const;

/** Lines to go through one by one: J and K move, A agrees, C corrects, Q asks. */
export function CheckDesk({ title, blocks, check, marks, onMark, onConclude, onAnswer, mayAnswer }: Props) {
  const lines = blocks.map((b) => b.id);
  const [line, setLine] = useState(lines[0] ?? '');
  // What is being written at each line, so that moving on and coming back loses nothing.
  const [drafts, setDrafts] = useState<Record<string, MarkDraft>>({});
  const working = check.mine && check.state === 'open';
  const draft = drafts[line] ?? marks.find((m) => m.line === line) ?? noMark;
  const write = (part: Partial<MarkDraft>) =>
    setDrafts((all) => ({ ...all, [line]: { kind: draft.kind, text: draft.text, ...part } }));
  const go = (to: string | undefined) => {
    if (to === undefined) return;
    setLine(to);
    document.getElementById(`line-${to}`)?.scrollIntoView({ block: 'nearest' });
  };
  const step = (by: number) => go(lines[lines.indexOf(line) + by]);
  useCheckKeys({ working, onStep: step, onKind: (kind) => write({ kind }) });
  const sheet = (
    <SheetView
      blocks={blocks}
      on={working ? line : undefined}
      wideMargin
      marks={(block) => (
        <LineMark
          line={block.id}
          mark={marks.find((m) => m.line === block.id)}
          onPick={working ? setLine : undefined}
        />
      )}
    />
  );
  return (
    <div className="frozenzones">
      <ReadingPage className="frozenpage" label="Sheet" focusable={!working}>
        <h1>{title}</h1>
        {working ? <LinePicker onPick={setLine}>{sheet}</LinePicker> : sheet}
      </ReadingPage>
      <aside className="frozenside">
        <p>{sentence(check)}</p>
        {check.note === '' ? null : <p>{check.note}</p>}
        {working ? (
          <>
            <MarkForm
              action={onMark}
              line={line}
              draft={draft}
              onWrite={write}
              onStep={step}
              onLeft={(left) =>
                setDrafts((all) => Object.fromEntries(Object.entries(all).filter(([at]) => at !== left)))
              }
            />
            <p className="ans">
              {new Set(marks.map((m) => m.line)).size} of {lines.length} lines marked.
            </p>
            <ConcludeForm action={onConclude} />
          </>
        ) : null}
        <MarkList
          marks={marks}
          mayAnswer={mayAnswer && (check.state === 'open' || check.state === 'returned')}
          onAnswer={onAnswer}
        />
      </aside>
    </div>
  );
}

function sentence(check: Props['check']): string {
  switch (check.state) {
    case 'open':
      return check.mine ? 'You check this sheet.' : `${check.checker} checks this sheet.`;
    case 'agreed':
      return `${check.checker} agreed this sheet.`;
    case 'returned':
      return `${check.checker} returned this sheet.`;
    case 'void':
      return 'The sheet changed meanwhile: this check is void. It stays readable.';
  }
}
