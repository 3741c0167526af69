'use client';

import { useState } from 'react';
import type { FormState } from '@/app/components/form-state';
import type { Block } from '@/templates/block';
import { SheetView } from '@/templates/screen/sheet-view';
import { CommentForm } from './comment-form';
import { DecisionForm } from './decision-form';

export interface ReviewComment {
  id: string;
  number: number;
  revisionId: string | null;
  line: string;
  code: string;
  text: string;
  answer: string | null;
}

export type ReviewAction = (state: FormState, form: FormData) => Promise<FormState>;

interface Props {
  purpose: string;
  remarks: string;
  sheets: { revisionId: string; number: string; title: string; revision: number; blocks: Block[] }[];
  comments: ReviewComment[];
  decisions: string[];
  decision: { words: string; author: string; at: string } | undefined;
  file: string;
  onComment: ReviewAction;
  onDecide: ReviewAction;
}

/** The package sheet by sheet, with its comments in the margin of the page and the decision beside it. */
export function ReviewDesk({
  purpose,
  remarks,
  sheets,
  comments,
  decisions,
  decision,
  file,
  onComment,
  onDecide,
}: Props) {
  const [place, setPlace] = useState<{ revisionId: string; line: string } | undefined>();
  const first = sheets[0];
  return (
    <div className="reviewzones">
      <div className="reviewpages">
        <div className="in">
          <h1>{purpose}</h1>
          {remarks === '' ? null : <p>{remarks}</p>}
          <p>
            <a className="t" href={file}>
              The sealed package as PDF
            </a>
          </p>
        </div>
        {sheets.map((s) => (
          <section key={s.revisionId} id={s.number} className="leaf" aria-label={`${s.number} ${s.title}`}>
            <h2 className="leafhead">
              {s.number} {s.title} <span className="text-ink3">revision {s.revision}</span>
            </h2>
            <SheetView
              blocks={s.blocks}
              on={place?.revisionId === s.revisionId ? place.line : undefined}
              wideMargin
              marks={(block) => (
                <LineMarks
                  line={block.id}
                  closed={decision !== undefined}
                  pins={comments.filter((c) => c.revisionId === s.revisionId && c.line === block.id)}
                  onPick={() => setPlace({ revisionId: s.revisionId, line: block.id })}
                />
              )}
            />
          </section>
        ))}
      </div>
      <aside className="reviewside" aria-label="Comments and decision">
        {decision ? null : (
          <CommentForm
            action={onComment}
            place={
              place ??
              (first ? { revisionId: first.revisionId, line: first.blocks[0]?.id ?? '1' } : undefined)
            }
            sheets={sheets.map((s) => ({
              revisionId: s.revisionId,
              number: s.number,
              lines: s.blocks.map((b) => b.id),
            }))}
            onPlace={setPlace}
          />
        )}
        <CommentList comments={comments} sheets={sheets} />
        {decision ? (
          <section>
            <h2>Decision</h2>
            <p>
              <b>{decision.words}</b>, {decision.author}, {decision.at}. It is recorded once and stands.
            </p>
          </section>
        ) : (
          <DecisionForm action={onDecide} decisions={decisions} comments={comments.length} />
        )}
      </aside>
    </div>
  );
}

function LineMarks({
  line,
  pins,
  closed,
  onPick,
}: {
  line: string;
  pins: ReviewComment[];
  closed: boolean;
  onPick: () => void;
}) {
  return (
    <span className="pins">
      {pins.map((p) => (
        <span key={p.id} className="pin">
          {p.number}
        </span>
      ))}
      {closed ? null : (
        <button type="button" className="pinhere" aria-label={`Comment on line ${line}`} onClick={onPick}>
          +
        </button>
      )}
    </span>
  );
}

function CommentList({ comments, sheets }: { comments: ReviewComment[]; sheets: Props['sheets'] }) {
  if (comments.length === 0) return null;
  const sheetOf = (id: string | null) => sheets.find((s) => s.revisionId === id)?.number ?? '';
  return (
    <section>
      <h2>Comments</h2>
      <ol className="commentlist">
        {comments.map((c) => (
          <li key={c.id}>
            <span className="pin">{c.number}</span> {c.text}
            <small>
              {sheetOf(c.revisionId)}, line {c.line}
              {c.code === '' ? '' : `, ${c.code}`}
              {c.answer === null ? ', open' : `. Answer: ${c.answer}`}
            </small>
          </li>
        ))}
      </ol>
    </section>
  );
}
