'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { ReadingPage } from '@/app/components/reading-page';
import { SubmitButton } from '@/app/components/submit-button';
import { AskForm } from './ask-form';
import type { CheckMark, FormAction, MarkAction } from './check-mark';
import { ConcludeForm } from './conclude-form';
import { MarkList } from './mark-list';

type Press = (state: FormState) => Promise<FormState>;

interface Props {
  title: string;
  basis: string;
  category: number;
  open: boolean;
  /** The checker's own sheet, with the number of its newest revision once it is frozen. */
  own: { name: string; href: string; frozen: number | undefined } | undefined;
  marks: CheckMark[];
  onBegin: Press;
  onCompare: Press;
  onAsk: FormAction;
  onSettle: MarkAction;
  onConclude: FormAction;
}

/** A check without the designer's sheet: the basis, the way to the checker's own sheet, and the queries. */
export function BlindDesk(props: Props) {
  const { title, basis, own, open, marks } = props;
  return (
    <div className="frozenzones">
      <ReadingPage className="frozenpage" label="Basis" focusable>
        <h1>{title}</h1>
        <div className="blindbody">
          <p>
            You check without the designer’s sheet. Derive your own from the basis and the drawings, freeze
            it, and the two are compared value by value. Number joints and cases as the drawings do: values
            are matched by name.
          </p>
          <h2>Basis</h2>
          <p className="whitespace-pre-line">
            {basis === '' ? 'The sheet states no basis of its own.' : basis}
          </p>
          {open ? <NextStep own={own} onBegin={props.onBegin} onCompare={props.onCompare} /> : null}
        </div>
      </ReadingPage>
      <aside className="frozenside">
        {open ? <AskForm action={props.onAsk} /> : null}
        <MarkList
          marks={marks}
          mayAnswer={false}
          onAnswer={noAnswer}
          onSettle={open ? props.onSettle : undefined}
        />
        {open ? <ConcludeForm action={props.onConclude} category={props.category} /> : null}
      </aside>
    </div>
  );
}

const noAnswer: MarkAction = (_id, state) => Promise.resolve(state);

function NextStep({ own, onBegin, onCompare }: Pick<Props, 'own' | 'onBegin' | 'onCompare'>) {
  const [begun, begin] = useActionState(onBegin, untouched);
  const [compared, compare] = useActionState(onCompare, untouched);
  if (!own)
    return (
      <form action={begin}>
        <FormMessage state={begun} />
        <SubmitButton>Begin your own sheet</SubmitButton>
      </form>
    );
  return (
    <>
      <p>
        <Link className="t" href={own.href}>
          Your own sheet {own.name}
        </Link>
        {own.frozen === undefined ? ', not frozen yet' : `, frozen as revision ${own.frozen}`}
      </p>
      {own.frozen === undefined ? null : (
        <form action={compare}>
          <FormMessage state={compared} />
          <p className="ans">The comparison is frozen with the check and is made once.</p>
          <SubmitButton>Compare with the designer’s sheet</SubmitButton>
        </form>
      )}
    </>
  );
}
