import type { DraftChangeNote } from '@/lib/model/compare-drafts';

interface Props {
  version: number;
  changes: readonly DraftChangeNote[];
  onReturn: () => void;
}

/** What differs between an earlier version and the draft in hand. */
export function VersionChanges({ version, changes, onReturn }: Props) {
  if (changes.length === 0) return <p>Version {version} says what the draft says now.</p>;
  return (
    <>
      <p>
        {changes.length === 1 ? 'One input was' : `${changes.length} inputs were`} written differently in
        version {version}.
      </p>
      <dl className="versionchanges">
        {changes.map((c) => (
          <div key={c.place}>
            <dt>{c.place}</dt>
            <dd>
              then {c.before ? <b>{c.before}</b> : 'blank'}, now {c.after ? <b>{c.after}</b> : 'blank'}
            </dd>
          </div>
        ))}
      </dl>
      <button type="button" className="btn p" onClick={onReturn}>
        Return to version {version}
      </button>
      <p className="ans">
        It becomes the newest version. Undo brings back the draft of now, and it stays here.
      </p>
    </>
  );
}
