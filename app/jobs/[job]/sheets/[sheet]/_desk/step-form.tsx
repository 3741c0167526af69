'use client';

import { FieldReader } from '@/lib/model/field-reader';
import type { Quantity } from '@/lib/model/quantity';
import { readGeometry } from '@/lib/model/read-geometry';
import { useDesk } from './desk-context';
import { type DeskStepKey, deskSteps, errorsOfStep } from './desk-step';
import type { Shown } from './drawing-tools';
import { LiveDrawing } from './live-drawing';
import { BasisStep } from './steps/basis-step';
import { ChecksStep } from './steps/checks-step';
import { CombinationsStep } from './steps/combinations-step';
import { GeometryStep } from './steps/geometry-step';
import { LoadsStep } from './steps/loads-step';
import { RedundantsStep } from './steps/redundants-step';
import { ResultsStep } from './steps/results-step';
import { SupportsStep } from './steps/supports-step';
import { StillOpen } from './still-open';
import type { Trial, Writing } from './writing';

interface Props {
  step: DeskStepKey;
  writing: Writing | undefined;
  pages: Extract<Writing, { state: 'written' }> | undefined;
  caseIndex: number;
  onCase: (index: number) => void;
  shown: Shown;
  onShow: (shown: Shown) => void;
  sets: readonly { key: string; title: string }[];
  tryOut: (quantities: Quantity[]) => Promise<Trial>;
}

/** The form of one step, under the drawing it speaks of. */
export function StepForm(props: Props) {
  const { step, writing, pages, sets, tryOut, caseIndex, onCase, shown, onShow } = props;
  const { draft, errors } = useDesk();
  const drawn = step === 'geometry' || step === 'supports' || step === 'loads';
  const members = readGeometry(new FieldReader(draft.units), draft).members.map((m) => m.id);
  const form = () => {
    switch (step) {
      case 'basis':
        return <BasisStep />;
      case 'geometry':
        return <GeometryStep />;
      case 'supports':
        return <SupportsStep />;
      case 'loads':
        return <LoadsStep current={caseIndex} onCase={onCase} />;
      case 'combinations':
        return <CombinationsStep sets={sets} writing={writing} />;
      case 'redundants':
        return <RedundantsStep writing={writing} pages={pages} tryOut={tryOut} />;
      case 'results':
        return <ResultsStep pages={pages} members={members} onShow={onShow} />;
      case 'checks':
        return <ChecksStep writing={writing} />;
    }
  };
  return (
    <>
      <div className="formhead">
        <h1>{deskSteps.find((s) => s.key === step)?.title}</h1>
      </div>
      <StillOpen errors={errorsOfStep(errors, step)} />
      {drawn ? (
        <LiveDrawing
          caseIndex={step === 'loads' ? caseIndex : undefined}
          width={418}
          shown={shown}
          onShow={onShow}
          overlay={writing?.state === 'written' ? pages?.overlay.drawings[caseIndex] : undefined}
        />
      ) : null}
      {form()}
    </>
  );
}
