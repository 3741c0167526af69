'use client';

import { useCallback, useEffect, useMemo, useReducer, useState } from 'react';
import type { ShapeRef } from '@/lib/figures/drawing';
import type { Draft } from '@/lib/model/draft';
import type { FieldError } from '@/lib/model/field-reader';
import { readDraft } from '@/lib/model/read-draft';
import { keepDraft, tryRedundants, writeCalculation } from '../actions';
import { DeskProvider } from './desk-context';
import { changeDraft } from './draft-history';
import { DraftNotices } from './draft-notices';
import { DraftVersions } from './draft-versions';
import type { Shown } from './drawing-tools';
import { FreezeForm } from './freeze-form';
import { KeepingLine } from './keeping-line';
import { LivePage } from './live-page';
import { StepForm } from './step-form';
import { StepList } from './step-list';
import { useKeeping } from './use-keeping';
import { useOpenElement } from './use-open-element';
import { usePlace } from './use-place';
import { useUndoKeys } from './use-undo-keys';
import { useWriting } from './use-writing';
import { writeAtPath } from './write-at-path';
import './desk.css';
import './desk-fields.css';
import './desk-table.css';
import './desk-page.css';
import './desk-versions.css';

export interface DeskProps {
  sheet: { id: string; number: string; nextRevision: number };
  initial: Draft;
  version: number;
  keptAt: string;
  sets: { key: string; title: string }[];
  imprint: string[];
}

/** The screen where one sheet is made: steps in the margin, the step's form, the live page. */
export function Desk({ sheet, initial, version, keptAt, sets, imprint }: DeskProps) {
  const [history, dispatch] = useReducer(changeDraft, { past: [], present: initial, future: [] });
  const draft = history.present;
  const place = usePlace();
  const { step, zone, caseIndex, goTo } = place;
  const [shown, setShown] = useState<Shown>('structure');
  const [visited, setVisited] = useState<ReadonlySet<string>>(new Set());
  const [lit, setLit] = useState<ShapeRef | undefined>();

  const keep = useCallback((at: number, d: Draft) => keepDraft(sheet.id, at, d), [sheet.id]);
  const keeping = useKeeping(sheet.id, draft, { version, keptAt }, keep);
  const overlay = shown === 'structure' ? 'M' : shown;
  const { writing, pages, late } = useWriting(draft, overlay, writeCalculation);
  useUndoKeys(dispatch);

  const errors = useMemo((): FieldError[] => {
    const read = readDraft(draft);
    if (!read.ok) return read.errors;
    return writing?.state === 'refused' && writing.refusal.place.path
      ? [{ path: writing.refusal.place.path, message: writing.refusal.message }]
      : [];
  }, [draft, writing]);

  // The tables speak of joints; a support is lit as its joint.
  const light = useCallback(
    (ref: ShapeRef | undefined) => setLit(ref?.of === 'support' ? { of: 'joint', id: ref.id } : ref),
    [],
  );
  const change = useCallback(
    (name: string, apply: (d: Draft) => Draft) =>
      dispatch({ type: 'edit', path: name, at: Date.now(), apply }),
    [],
  );
  const open = useOpenElement({ draft, caseIndex, change, goTo });
  const desk = useMemo(
    () => ({
      draft,
      errors,
      visited,
      lit,
      light,
      open,
      goTo,
      change,
      edit: (path: string, value: unknown) => change(path, (d) => writeAtPath(d, path, value)),
      visit: (path: string) => setVisited((v) => (v.has(path) ? v : new Set(v).add(path))),
    }),
    [draft, errors, visited, lit, light, open, goTo, change],
  );
  useEffect(() => {
    if (caseIndex > 0 && caseIndex >= draft.cases.length) place.setCase(Math.max(0, draft.cases.length - 1));
  }, [caseIndex, draft.cases.length, place.setCase]);
  const replace = (next: Draft) => dispatch({ type: 'replace', draft: next });

  return (
    <DeskProvider value={desk}>
      <aside className="margin deskmargin" data-zone={zone}>
        <div className="bigno">{sheet.number}</div>
        <div className="under">{draft.title}</div>
        <StepList
          draft={draft}
          current={step}
          onStep={(key) => {
            place.goStep(key);
          }}
          errors={errors}
          writing={writing}
        />
        <div className="mgfoot">
          <DraftVersions sheetId={sheet.id} draft={draft} onReturn={replace} />
        </div>
        <FreezeForm
          sheetId={sheet.id}
          number={sheet.nextRevision}
          ready={writing?.state === 'written'}
          handOver={keeping.handOver}
        />
      </aside>
      <main id="main" className="deskmain" data-zone={zone}>
        <div className="zones">
          <div className="in form">
            <DraftNotices
              sheetId={sheet.id}
              version={version}
              state={keeping.state}
              goOn={keeping.goOn}
              replace={replace}
            />
            <StepForm
              step={step}
              writing={writing}
              pages={pages}
              sets={sets}
              caseIndex={caseIndex}
              onCase={place.setCase}
              shown={shown}
              onShow={setShown}
              tryOut={(q) => tryRedundants(draft, q)}
            />
          </div>
          <LivePage
            sheet={sheet.number}
            step={step}
            caseIndex={caseIndex}
            writing={writing}
            pages={pages}
            late={late}
            errors={errors}
          />
        </div>
      </main>
      <nav className="three" aria-label="Parts of the desk">
        {(['steps', 'form', 'page'] as const).map((z) => (
          <button
            key={z}
            type="button"
            aria-current={z === zone ? 'true' : undefined}
            onClick={() => place.setZone(z)}
          >
            {z === 'steps' ? 'Steps' : z === 'form' ? 'Form' : 'Page'}
          </button>
        ))}
      </nav>
      <footer className="imprint">
        {imprint.map((part) => (
          <span key={part}>{part}</span>
        ))}
        <span className="end">
          <KeepingLine state={keeping.state} />
        </span>
      </footer>
    </DeskProvider>
  );
}
