'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useId, useRef, useState } from 'react';
import { KeyFileError } from '@/lib/signing/key-file-error';
import type { CertificateFacts } from '@/lib/signing/signer';
import { SignerClient, SignerError } from '@/lib/signing/signer-client';
import { complete, prepare } from './actions';

interface Props {
  submittalId: string;
  pages: number;
  back: string;
}

/** What went wrong, in words for whoever seals. */
class Said extends Error {}

const lost = 'The server did not answer. Open the submittal to see whether it is sealed, then try again.';

const day = (d: Date) => d.toLocaleDateString('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });

/** Opens the key in this browser, signs the prepared file with it, and hands over the signature alone. */
export function SealForm({ submittalId, pages, back }: Props) {
  const id = useId();
  const router = useRouter();
  const client = useRef<SignerClient | undefined>(undefined);
  const file = useRef<HTMLInputElement>(null);
  const [password, setPassword] = useState('');
  const [facts, setFacts] = useState<CertificateFacts | undefined>();
  const [said, setSaid] = useState('');
  const [busy, setBusy] = useState<string | undefined>();

  useEffect(() => () => client.current?.close(), []);

  const during = async (words: string, work: () => Promise<void>) => {
    setBusy(words);
    setSaid('');
    try {
      await work();
    } catch (error) {
      const own = error instanceof Said || error instanceof KeyFileError || error instanceof SignerError;
      setSaid(own ? error.message : lost);
    } finally {
      setBusy(undefined);
    }
  };
  const open = () =>
    during('Opening the key …', async () => {
      const chosen = file.current?.files?.[0];
      if (!chosen) throw new Said('Choose your key file, such as name.p12.');
      client.current?.close();
      client.current = new SignerClient();
      // The password is not kept, whether it opens the key or not.
      setPassword('');
      setFacts(await client.current.open(chosen, password));
    });
  const close = () => {
    client.current?.close();
    client.current = undefined;
    setFacts(undefined);
  };
  const seal = () =>
    during('Sealing …', async () => {
      const signer = client.current;
      if (!signer) throw new Said('Open your key first.');
      const prepared = await prepare(submittalId);
      if (!prepared.ok) throw new Said(prepared.message);
      const { preparedId, hole } = prepared.value;
      const answer = await fetch(`${back}/prepared/${preparedId}`);
      if (!answer.ok) throw new Said('The prepared file did not arrive. Nothing was sealed.');
      const { cms } = await signer.sign(await answer.arrayBuffer(), hole);
      const done = await complete(preparedId, [...cms]);
      if (!done.ok) throw new Said(done.message);
      close();
      router.push(back);
      router.refresh();
    });

  return (
    <div>
      <h2>Your key</h2>
      {facts ? (
        <dl className="facts2">
          <dt>Holder</dt>
          <dd>
            {facts.holder.name}
            {facts.holder.licenceNumber === undefined ? '' : `, licence ${facts.holder.licenceNumber}`}
          </dd>
          <dt>Issued by</dt>
          <dd>{facts.issuer}</dd>
          <dt>Valid</dt>
          <dd>
            {day(facts.validFrom)} to {day(facts.validTo)}
          </dd>
        </dl>
      ) : (
        <form
          onSubmit={(e) => {
            e.preventDefault();
            void open();
          }}
        >
          <div className="fld">
            <label htmlFor={`${id}-file`}>Key file</label>
            <div className="wr">
              <input id={`${id}-file`} ref={file} type="file" accept=".p12,.pfx" className="val" />
            </div>
          </div>
          <div className="fld">
            <label htmlFor={`${id}-password`}>Password of the key</label>
            <div className="wr">
              <input
                id={`${id}-password`}
                type="password"
                className="val"
                autoComplete="off"
                value={password}
                onChange={(e) => setPassword(e.target.value)}
              />
            </div>
          </div>
          <button type="submit" className="btn" disabled={busy !== undefined}>
            Open the key
          </button>
        </form>
      )}
      <p className="keystays">
        The key stays in this browser. Only the signature leaves it, and the key is forgotten when you close
        this page.
      </p>
      <p role="status" className={said === '' ? 'ans' : 'message e'}>
        {said === '' ? (busy ?? '') : said}
      </p>
      {facts ? (
        <div className="flex gap-3">
          <button
            type="button"
            className="btn seal"
            onClick={() => void seal()}
            disabled={busy !== undefined}
          >
            Seal {pages} pages
          </button>
          <button type="button" className="btn q" onClick={close}>
            Close the key
          </button>
        </div>
      ) : null}
    </div>
  );
}
