import Form from 'next/form';
import Link from 'next/link';
import { type JobsQuery, jobsHref } from './jobs-query';

const states = [
  { state: 'open', label: 'Open' },
  { state: 'closed', label: 'Closed' },
] as const;

const sorts = [
  { sort: 'changed', label: 'last changed' },
  { sort: 'number', label: 'number' },
  { sort: 'title', label: 'title' },
] as const;

/** Above the list of jobs: which ones, in which order, a search, and the way to a new one. */
export function JobsBar({ query, mayStart }: { query: JobsQuery; mayStart: boolean }) {
  return (
    <>
      <div className="titlerow">
        <h2>Jobs</h2>
        <nav className="tabs" aria-label="Which jobs">
          {states.map(({ state, label }) => (
            <Link
              key={state}
              href={jobsHref(query, { state })}
              aria-current={query.state === state ? 'true' : undefined}
            >
              {label}
            </Link>
          ))}
        </nav>
        <span className="sp" />
        <Form action="/jobs" role="search" className="find wr">
          <label className="sr-only" htmlFor="search">
            Find a job by number, title, place or authority
          </label>
          <input
            key={query.search}
            id="search"
            name="search"
            type="search"
            className="val"
            defaultValue={query.search}
            placeholder="Number, title, place or authority"
          />
          {query.state === 'open' ? null : <input type="hidden" name="state" value={query.state} />}
          {query.sort === 'changed' ? null : <input type="hidden" name="sort" value={query.sort} />}
          <button type="submit" className="text-pen">
            Find
          </button>
        </Form>
        {mayStart ? (
          <Link className="btn p" href="/jobs/start">
            Start a job
          </Link>
        ) : null}
      </div>
      <p className="s i2 mt-1">
        By{' '}
        {sorts.map(({ sort, label }, i) => (
          <span key={sort}>
            {i > 0 ? ', ' : ''}
            {query.sort === sort ? (
              <b aria-current="true">{label}</b>
            ) : (
              <Link className="t" href={jobsHref(query, { sort })}>
                {label}
              </Link>
            )}
          </span>
        ))}
      </p>
    </>
  );
}
