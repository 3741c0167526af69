'use client';

import Link from 'next/link';

/** The calm page for a fault of ours. The cause is in the log under the digest, never on the screen. */
export default function ErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <div className="book">
      <header className="head">
        <Link className="word" href="/">
          Fairhand
        </Link>
        <span className="path">
          <b>Something broke</b>
        </span>
      </header>
      <aside className="margin">
        <div className="bigno red">500</div>
        <div className="under">fault on our side</div>
      </aside>
      <main id="main">
        <div className="in">
          <h1>Fairhand broke while writing this page.</h1>
          <p className="lead3">
            What was kept before stays kept. Open the page again, or go back to the jobs.
          </p>
          <div className="row">
            <button type="button" className="btn p" onClick={reset}>
              Open it again
            </button>
            <Link className="btn" href="/jobs">
              Jobs
            </Link>
          </div>
          {error.digest ? (
            <p className="s i2 mt-6">
              If it happens again, tell us fault <b>{error.digest}</b>. The log holds the fault and where it
              happened, not your figures.
            </p>
          ) : null}
        </div>
      </main>
      <footer className="imprint">
        <span>Fairhand</span>
      </footer>
    </div>
  );
}
