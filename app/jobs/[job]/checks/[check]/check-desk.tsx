'use client';

import { useEffect, useState } from 'react';
import type { FormState } from '@/app/components/form-state';
import { StatusMark } from '@/app/components/status-mark';
import type { Block } from '@/templates/block';
import { SheetView } from '@/templates/screen/sheet-view';
import { ConcludeForm } from './conclude-form';
import { MarkForm } from './mark-form';
import { MarkList } from './mark-list';

export interface CheckMark {
  id: string;
  line: string;
  kind: 'agrees' | 'correct' | 'query';
  text: string;
  answer: string | null;
}

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

const keys: Record<string, CheckMark['kind']> = { a: 'agrees', c: 'correct', q: 'query' };

/** Lines to go through one by one: J and K move, A agrees, C corrects, Q asks. */
export function CheckDesk({ title, blocks, check, marks, onMark, onConclude, onAnswer, mayAnswer }: Props) {
  const lines = blocks.map((b) => b.id);
  const [line, setLine] = useState(lines[0] ?? '');
  const [kind, setKind] = useState<CheckMark['kind']>('agrees');
  const working = check.mine && check.state === 'open';

  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const typing =
        event.target instanceof HTMLElement && /^(INPUT|TEXTAREA|SELECT)$/.test(event.target.tagName);
      if (!working || typing || event.ctrlKey || event.metaKey || event.altKey) return;
      const at = lines.indexOf(line);
      const key = event.key.toLowerCase();
      const next = key === 'j' ? lines[at + 1] : key === 'k' ? lines[at - 1] : undefined;
      if (next !== undefined) setLine(next);
      const mark = keys[key];
      if (mark) setKind(mark);
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [working, line, lines]);

  return (
    <div className="frozenzones">
      <section className="frozenpage" aria-label="Sheet">
        <SheetView
          blocks={blocks}
          on={working ? line : undefined}
          wideMargin
          marks={(block) => {
            const mark = marks.find((m) => m.line === block.id);
            return (
              <span className="linemark">
                {mark ? <StatusMark mark={mark.kind} alone /> : null}
                {working ? (
                  <button
                    type="button"
                    className="linepick"
                    aria-label={`Mark line ${block.id}`}
                    onClick={() => setLine(block.id)}
                  >
                    ›
                  </button>
                ) : null}
              </span>
            );
          }}
        />
      </section>
      <aside className="frozenside">
        <h1>{title}</h1>
        <p>{sentence(check)}</p>
        {check.note === '' ? null : <p>{check.note}</p>}
        {working ? (
          <>
            <MarkForm
              action={onMark}
              line={line}
              lines={lines}
              kind={kind}
              onLine={setLine}
              onKind={setKind}
            />
            <ConcludeForm action={onConclude} />
          </>
        ) : null}
        <MarkList marks={marks} mayAnswer={mayAnswer && check.state === 'open'} onAnswer={onAnswer} />
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
