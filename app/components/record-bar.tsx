import Form from 'next/form';
import type { RecordQuery } from './record-query';

interface RecordBarProps {
  base: string;
  query: RecordQuery;
  /** Sheets and submittals an entry can be about; none for the record of the office. */
  about: { id: string; label: string }[];
  people: { id: string; name: string }[];
}

/** Which entries are shown: about one thing, by one person, with or without drafts. */
export function RecordBar({ base, query, about, people }: RecordBarProps) {
  return (
    <Form action={base} className="row" aria-label="Which entries">
      {about.length > 0 ? (
        <label>
          <span className="lbl">About</span>
          <span className="wr">
            <select name="about" className="val" defaultValue={query.about}>
              <option value="">everything in the job</option>
              {about.map((a) => (
                <option key={a.id} value={a.id}>
                  {a.label}
                </option>
              ))}
            </select>
          </span>
        </label>
      ) : null}
      <label>
        <span className="lbl">By</span>
        <span className="wr">
          <select name="person" className="val" defaultValue={query.person}>
            <option value="">everybody</option>
            {people.map((p) => (
              <option key={p.id} value={p.id}>
                {p.name}
              </option>
            ))}
          </select>
        </span>
      </label>
      <label>
        <span className="lbl">Drafts kept while typing</span>
        <span className="wr">
          <select name="drafts" className="val" defaultValue={query.drafts}>
            <option value="">left out</option>
            <option value="shown">shown</option>
          </select>
        </span>
      </label>
      <button type="submit" className="btn self-end">
        Show
      </button>
    </Form>
  );
}
