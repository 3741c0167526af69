'use client';

import { useRef, useState } from 'react';
import type { Verified } from '@/lib/services/verification/verify-file';
import { Hung } from '../components/ledger';
import { ContentsReport } from './contents-report';
import { SignatureReport } from './signature-report';

type Standing =
  | { state: 'none' }
  | { state: 'reading'; name: string }
  | { state: 'failed'; name: string; message: string }
  | { state: 'read'; name: string; verified: Verified };

/** Takes a file, sends its bytes, and sets out what was found. */
export function VerifyForm({ zone }: { zone: string }) {
  const [standing, setStanding] = useState<Standing>({ state: 'none' });
  const newest = useRef(0);

  async function verify(file: File) {
    const turn = ++newest.current;
    setStanding({ state: 'reading', name: file.name });
    const found = await ask(file);
    if (turn === newest.current) setStanding(found);
  }

  return (
    <>
      <Hung at="first">
        <div className="fld max-w-[676px]">
          <label htmlFor="file">PDF file</label>
          <input
            id="file"
            type="file"
            accept="application/pdf,.pdf"
            className="filefield"
            onChange={(event) => {
              const file = event.target.files?.[0];
              if (file) void verify(file);
            }}
          />
        </div>
        <div role="status">
          {standing.state === 'reading' ? <p className="message">Reading {standing.name} …</p> : null}
          {standing.state === 'failed' ? (
            <p className="message e">
              {standing.name}: {standing.message}
            </p>
          ) : null}
          {standing.state === 'read' ? <Verdict name={standing.name} verified={standing.verified} /> : null}
        </div>
      </Hung>
      {standing.state === 'read' ? (
        <>
          <SignatureReport verified={standing.verified} zone={zone} />
          <ContentsReport contents={standing.verified.contents} />
        </>
      ) : null}
    </>
  );
}

/** The one sentence that somebody in a hurry reads. */
function Verdict({ name, verified }: { name: string; verified: Verified }) {
  const { report, contents } = verified;
  if (report.intact && contents.ours)
    return <p className="message done">{name} is sealed, and nothing was changed since.</p>;
  if (report.intact)
    return <p className="message">{name} is signed and unchanged, but it is not a package of ours.</p>;
  if (report.signers.length === 0 && report.reasons.every((r) => r.code === 'not-signed'))
    return (
      <p className="message e">
        {name} bears no seal.{' '}
        {contents.ours ? 'It is an unsigned copy, not the record.' : 'It is not a package of ours.'}
      </p>
    );
  return <p className="message e">{name} is not what was sealed, or cannot be shown to be.</p>;
}

async function ask(file: File): Promise<Standing> {
  try {
    const answer = await fetch('/verify/file', {
      method: 'POST',
      body: file,
      headers: { 'content-type': 'application/pdf' },
    });
    const body: unknown = await answer.json();
    if (answer.ok) return { state: 'read', name: file.name, verified: body as Verified };
    const message = (body as { message?: string }).message;
    return { state: 'failed', name: file.name, message: message ?? 'It could not be verified.' };
  } catch {
    return {
      state: 'failed',
      name: file.name,
      message: 'There is no connection to the server. Nothing was verified.',
    };
  }
}
