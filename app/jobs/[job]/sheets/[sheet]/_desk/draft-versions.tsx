'use client';

import { useRef, useState } from 'react';
import { compareDrafts } from '@/lib/model/compare-drafts';
import type { Draft } from '@/lib/model/draft';
import { listVersions, openVersion } from '../actions';
import { VersionChanges } from './version-changes';
import type { OpenedVersion, VersionLine } from './writing';

interface Props {
  sheetId: string;
  draft: Draft;
  onReturn: (draft: Draft) => void;
}

const when = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'medium' });

/** Every version of the draft that was kept: look at one, see what differs from now, return to it. */
export function DraftVersions({ sheetId, draft, onReturn }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const [versions, setVersions] = useState<VersionLine[]>([]);
  const [opened, setOpened] = useState<OpenedVersion | undefined>();
  const [said, setSaid] = useState('');
  const [more, setMore] = useState(false);

  async function attempt(work: () => Promise<void>) {
    try {
      setSaid('');
      await work();
    } catch {
      setSaid('The history cannot be read now. The draft in hand is not touched.');
    }
  }
  const read = (page: number) =>
    attempt(async () => {
      const found = await listVersions(sheetId, page);
      setVersions((known) => (page === 1 ? found.versions : [...known, ...found.versions]));
      setMore(found.more);
    });
  const look = (version: number) => attempt(async () => setOpened(await openVersion(sheetId, version)));

  return (
    <>
      <button
        type="button"
        className="linkish"
        onClick={() => {
          setOpened(undefined);
          dialog.current?.showModal();
          void read(1);
        }}
      >
        History of the draft
      </button>
      <dialog ref={dialog} className="versions" aria-labelledby="versions-title">
        <header>
          <h2 id="versions-title">History of the draft</h2>
          <button type="button" className="btn" onClick={() => dialog.current?.close()}>
            Close
          </button>
        </header>
        <p role="status" className={said === '' ? undefined : 'ans e'}>
          {said}
        </p>
        <div className="versionzones">
          <ol aria-label="Versions kept">
            {versions.map((v) => (
              <li key={v.version}>
                <button
                  type="button"
                  aria-current={opened?.version === v.version ? 'true' : undefined}
                  onClick={() => look(v.version)}
                >
                  {v.version} <span className="i2">{`${when.format(new Date(v.keptAt))}, ${v.by}`}</span>
                </button>
              </li>
            ))}
            {more ? (
              <li>
                <button
                  type="button"
                  className="linkish"
                  onClick={() => read(Math.floor(versions.length / 50) + 1)}
                >
                  Earlier versions
                </button>
              </li>
            ) : null}
          </ol>
          <section aria-live="polite" aria-label="The version looked at">
            {opened ? (
              <VersionChanges
                version={opened.version}
                changes={compareDrafts(opened.draft, draft)}
                onReturn={() => {
                  onReturn(opened.draft);
                  dialog.current?.close();
                }}
              />
            ) : (
              <p className="i2">Choose a version to see what was written differently then.</p>
            )}
          </section>
        </div>
      </dialog>
    </>
  );
}
