'use client';

import Link from 'next/link';
import { type ReactNode, useState } from 'react';
import { LinePicker } from '@/app/components/line-picker';
import { ReadingPage } from '@/app/components/reading-page';
import type { Block } from '@/templates/block';
import { SheetView } from '@/templates/screen/sheet-view';
import type { CheckMark, EarlierMark, FormAction, MarkAction } from './check-mark';
import { ConcludeForm } from './conclude-form';
import { EarlierMarks } from './earlier-marks';
import { InputsLink } from './inputs-link';
import { LineMark } from './line-mark';
import { MarkForm } from './mark-form';
import { MarkList } from './mark-list';
import { useCheckKeys } from './use-check-keys';
import { useKeysChoice } from './use-keys-choice';

export type MarkDraft = Pick<CheckMark, 'kind' | 'text'>;

interface Props {
  title: string;
  blocks: Block[];
  check: {
    state: 'open' | 'agreed' | 'returned' | 'void';
    mine: boolean;
    checker: string;
    category: number;
    note: string;
    declaration: string;
  };
  marks: CheckMark[];
  earlier: EarlierMark[];
  /** Where the inputs are held against drawings, and how many there are. */
  inputs: { href: string; all: number; asked: boolean };
  onMark: FormAction;
  onConclude: FormAction;
  onAnswer: MarkAction;
  onSettle: MarkAction;
  onVerify: MarkAction;
  mayAnswer: boolean;
  /** That a later revision took the place of this one. */
  notice?: ReactNode;
  /** Where the certificate with the query schedule is. */
  certificate: string;
  /** Where the checker's own values stand beside the designer's. */
  comparison?: string;
}

const noMark = { kind: 'agrees', text: '' } as const;

/** Lines to go through one by one: J and K move, A agrees, C corrects, Q asks. */
export function CheckDesk(props: Props) {
  const { title, blocks, check, marks, earlier, inputs } = props;
  const lines = blocks.map((b) => b.id);
  const [line, setLine] = useState(lines[0] ?? '');
  // What is being written at each line, so that moving on and coming back loses nothing.
  const [drafts, setDrafts] = useState<Record<string, MarkDraft>>({});
  const working = check.mine && check.state === 'open';
  const draft = drafts[line] ?? atLine(marks, line) ?? noMark;
  const write = (part: Partial<MarkDraft>) =>
    setDrafts((all) => ({ ...all, [line]: { kind: draft.kind, text: draft.text, ...part } }));
  const go = (to: string | undefined) => {
    if (to === undefined) return;
    setLine(to);
    document.getElementById(`line-${to}`)?.scrollIntoView({ block: 'nearest' });
  };
  const step = (by: number) => go(lines[lines.indexOf(line) + by]);
  const [keys, chooseKeys] = useKeysChoice();
  useCheckKeys({ working: working && keys, onStep: step, onKind: (kind) => write({ kind }) });
  const sheet = (
    <SheetView
      blocks={blocks}
      on={working ? line : undefined}
      wideMargin
      marks={(block) => (
        <LineMark line={block.id} mark={atLine(marks, block.id)} onPick={working ? setLine : undefined} />
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
        {props.notice}
        {check.note === '' ? null : <p>{check.note}</p>}
        {check.declaration === '' ? null : <p className="ans">Declared: {check.declaration}</p>}
        {props.comparison ? (
          <Link className="t" href={props.comparison}>
            The checker’s own values beside the designer’s
          </Link>
        ) : null}
        <p>
          <a className="t" href={props.certificate}>
            {check.state === 'agreed' ? 'Certificate and query schedule' : 'Query schedule so far'}, PDF
          </a>
        </p>
        <InputsLink {...inputs} marks={marks} />
        <EarlierMarks marks={earlier} onVerify={working ? props.onVerify : undefined} />
        {working ? (
          <>
            <MarkForm
              action={props.onMark}
              line={line}
              draft={draft}
              onWrite={write}
              onStep={step}
              onLeft={(left) =>
                setDrafts((all) => Object.fromEntries(Object.entries(all).filter(([at]) => at !== left)))
              }
            />
            <label className="declare">
              <input type="checkbox" checked={keys} onChange={(event) => chooseKeys(event.target.checked)} />
              Single keys mark and move
            </label>
            <p className="ans">
              {marks.filter((m) => m.place === 'line').length} of {lines.length} lines marked.
            </p>
            <ConcludeForm action={props.onConclude} category={check.category} />
          </>
        ) : null}
        <MarkList
          marks={marks}
          mayAnswer={props.mayAnswer && (check.state === 'open' || check.state === 'returned')}
          onAnswer={props.onAnswer}
          onSettle={working ? props.onSettle : undefined}
        />
      </aside>
    </div>
  );
}

const atLine = (marks: CheckMark[], line: string) => marks.find((m) => m.place === 'line' && m.line === line);

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
