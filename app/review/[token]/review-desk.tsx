'use client';

import { useState } from 'react';
import type { FormState } from '@/app/components/form-state';
import { LinePicker } from '@/app/components/line-picker';
import type { Block } from '@/templates/block';
import { SheetView } from '@/templates/screen/sheet-view';
import { CommentForm } from './comment-form';
import { CommentList } from './comment-list';
import { DecisionForm } from './decision-form';
import { LinePins } from './line-pins';

export interface ReviewComment {
  id: string;
  number: number;
  revisionId: string | null;
  line: string;
  code: string;
  text: string;
  answer: string | null;
  state: 'open' | 'answered' | 'accepted' | 'reopened';
  /** Where it is pinned, in words. */
  where: string;
}

export type ReviewAction = (state: FormState, form: FormData) => Promise<FormState>;

export type SettleAction = (commentId: string, state: FormState, form: FormData) => Promise<FormState>;

interface Props {
  purpose: string;
  remarks: string;
  sheets: {
    revisionId: string;
    number: string;
    title: string;
    revision: number;
    /** Flagged when new or changed since the last submittal. */
    change: string;
    blocks: Block[];
  }[];
  comments: ReviewComment[];
  /** Comments on earlier submittals of the job, for the back-check. */
  earlier: ReviewComment[];
  decisions: string[];
  decision: { words: string; author: string; at: string } | undefined;
  file: string;
  onComment: ReviewAction;
  onDecide: ReviewAction;
  onSettle: SettleAction;
}

const ignore = () => undefined;

/** The package sheet by sheet, with its comments in the margin of the page and the decision beside it. */
export function ReviewDesk({
  purpose,
  remarks,
  sheets,
  comments,
  earlier,
  decisions,
  decision,
  file,
  onComment,
  onDecide,
  onSettle,
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
              {s.change === '' ? null : <em className="ml-3">{s.change}</em>}
            </h2>
            <LinePicker onPick={decision ? ignore : (line) => setPlace({ revisionId: s.revisionId, line })}>
              <SheetView
                blocks={s.blocks}
                on={place?.revisionId === s.revisionId ? place.line : undefined}
                wideMargin
                marks={(block) => (
                  <LinePins
                    line={block.id}
                    closed={decision !== undefined}
                    pins={comments
                      .filter((c) => c.revisionId === s.revisionId && c.line === block.id)
                      .map((c) => c.number)}
                    onPick={() => setPlace({ revisionId: s.revisionId, line: block.id })}
                  />
                )}
              />
            </LinePicker>
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
        <CommentList title="Comments" comments={comments} onSettle={onSettle} />
        <CommentList title="Comments on earlier submittals" comments={earlier} onSettle={onSettle} />
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
