'use client';

import { useCallback, useEffect, useMemo, useReducer, useState } from 'react';
import type { ShapeRef } from '@/lib/figures/drawing';
import type { Draft } from '@/lib/model/draft';
import type { FieldError } from '@/lib/model/field-reader';
import { readDraft } from '@/lib/model/read-draft';
import { keepDraft, tryRedundants, writeCalculation } from '../actions';
import { ConflictSlip } from './conflict-slip';
import { DeskProvider } from './desk-context';
import type { DeskStepKey } from './desk-step';
import { changeDraft } from './draft-history';
import { DraftVersions } from './draft-versions';
import { FreezeForm } from './freeze-form';
import { KeepingLine } from './keeping-line';
import { LivePage } from './live-page';
import { StepForm } from './step-form';
import { StepList } from './step-list';
import { readBackup, useKeeping } from './use-keeping';
import { useWriting } from './use-writing';
import { writeAtPath } from './write-at-path';
import './desk.css';

export interface DeskProps {
  sheet: { id: string; number: string; nextRevision: number };
  initial: Draft;
  version: number;
  keptAt: string;
  sets: { key: string; title: string }[];
  imprint: string[];
}

type Zone = 'steps' | 'form' | 'page';

/** The screen where one sheet is made: steps in the margin, the step's form, the live page. */
export function Desk({ sheet, initial, version, keptAt, sets, imprint }: DeskProps) {
  const [history, dispatch] = useReducer(changeDraft, { past: [], present: initial, future: [] });
  const draft = history.present;
  const [step, setStep] = useState<DeskStepKey>('geometry');
  const [zone, setZone] = useState<Zone>('form');
  const [visited, setVisited] = useState<ReadonlySet<string>>(new Set());
  const [lit, light] = useState<ShapeRef | undefined>();
  const [waiting, setWaiting] = useState<Draft | undefined>();

  const keep = useCallback((at: number, d: Draft) => keepDraft(sheet.id, at, d), [sheet.id]);
  const keeping = useKeeping(sheet.id, draft, { version, keptAt }, keep);
  const { writing, pages, late } = useWriting(draft, writeCalculation);

  useEffect(() => setWaiting(readBackup(sheet.id, version)), [sheet.id, version]);
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const command = event.ctrlKey || event.metaKey;
      if (!command || event.key.toLowerCase() !== 'z') return;
      event.preventDefault();
      dispatch({ type: event.shiftKey ? 'redo' : 'undo' });
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, []);

  const errors = useMemo((): FieldError[] => {
    const read = readDraft(draft);
    if (!read.ok) return read.errors;
    return writing?.state === 'refused' && writing.refusal.place.path
      ? [{ path: writing.refusal.place.path, message: writing.refusal.message }]
      : [];
  }, [draft, writing]);

  const desk = useMemo(
    () => ({
      draft,
      errors,
      visited,
      lit,
      light,
      edit: (path: string, value: unknown) =>
        dispatch({ type: 'edit', path, at: Date.now(), apply: (d) => writeAtPath(d, path, value) }),
      change: (name: string, apply: (d: Draft) => Draft) =>
        dispatch({ type: 'edit', path: name, at: Date.now(), apply }),
      visit: (path: string) => setVisited((v) => (v.has(path) ? v : new Set(v).add(path))),
    }),
    [draft, errors, visited, lit],
  );

  return (
    <DeskProvider value={desk}>
      <aside className="margin deskmargin" data-zone={zone}>
        <div className="bigno">{sheet.number}</div>
        <div className="under">{draft.title}</div>
        <StepList
          current={step}
          onStep={(key) => {
            setStep(key);
            setZone('form');
          }}
          errors={errors}
          writing={writing}
        />
        <div className="mgfoot">
          <DraftVersions
            sheetId={sheet.id}
            draft={draft}
            onReturn={(d) => dispatch({ type: 'replace', draft: d })}
          />
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
            {waiting ? (
              <p className="ans" role="status">
                This browser holds changes that were not handed over.{' '}
                <button
                  type="button"
                  className="linkish"
                  onClick={() => {
                    dispatch({ type: 'replace', draft: waiting });
                    setWaiting(undefined);
                  }}
                >
                  Take them back
                </button>
              </p>
            ) : null}
            {keeping.state.state === 'conflict' ? (
              <ConflictSlip
                state={keeping.state}
                onMine={() =>
                  keeping.state.state === 'conflict' && keeping.goOn(keeping.state.version, undefined)
                }
                onTheirs={(theirs) => {
                  if (keeping.state.state === 'conflict') keeping.goOn(keeping.state.version, theirs);
                  dispatch({ type: 'replace', draft: theirs });
                }}
              />
            ) : null}
            <StepForm
              step={step}
              writing={writing}
              pages={pages}
              sets={sets}
              tryOut={(q) => tryRedundants(draft, q)}
            />
          </div>
          <LivePage sheet={sheet.number} writing={writing} pages={pages} late={late} errors={errors} />
        </div>
      </main>
      <nav className="three" aria-label="Parts of the desk">
        {(['steps', 'form', 'page'] as const).map((z) => (
          <button
            key={z}
            type="button"
            aria-current={z === zone ? 'true' : undefined}
            onClick={() => setZone(z)}
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
