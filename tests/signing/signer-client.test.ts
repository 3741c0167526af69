import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Bytes } from '@/lib/signing/bytes';
import { checkCms } from '@/lib/signing/check-cms';
import { KeyHolder } from '@/lib/signing/key-holder';
import { signedPart } from '@/lib/signing/signed-part';
import { SignerClient, type SignerPort } from '@/lib/signing/signer-client';
import type { SignerReply } from '@/lib/signing/signer-messages';
import { ines, makeBase, type Office, openOffice, prepare } from './office';

/** A worker without a browser: the same holder behind the same cloning of messages. */
function makePort(): SignerPort & { readonly sent: SignerReply[] } {
  const holder = new KeyHolder();
  const hearing: ((event: MessageEvent) => void)[] = [];
  const sent: SignerReply[] = [];
  return {
    sent,
    terminate: () => hearing.splice(0),
    addEventListener: (type: string, hear: unknown) => {
      if (type === 'message') hearing.push(hear as (event: MessageEvent) => void);
    },
    postMessage: async (message: never, transfer: unknown) => {
      const received = structuredClone(message, { transfer: transfer as ArrayBuffer[] });
      const reply = structuredClone(await holder.answer(received));
      sent.push(reply);
      for (const hear of hearing) hear({ data: reply } as MessageEvent);
    },
  };
}

let office: Office;
let file: Bytes;
beforeAll(async () => {
  office = await openOffice();
  ({ file } = await office.authority.issueKeyFile({ ...ines, key: 'P-256' }, 'a password'));
});
afterAll(() => office.stamps.close());

describe('the page’s side of the signing worker', () => {
  it('opens a key, signs a prepared file, and gets facts and a signature, never the key', async () => {
    const port = makePort();
    const client = new SignerClient(port);
    expect((await client.open(new Blob([file]), 'a password')).holder).toMatchObject(ines);
    const prepared = await prepare(await makeBase(), ines);
    const content = signedPart(prepared.bytes, prepared.hole);
    const { cms, sha256 } = await client.sign(prepared.bytes.slice().buffer, prepared.hole);
    expect((await checkCms(cms, content, ines, office.trust, new Date())).holder).toMatchObject(ines);
    expect(sha256).toBe(Buffer.from(await crypto.subtle.digest('SHA-256', content)).toString('hex'));
    expect(JSON.stringify(port.sent)).not.toMatch(/CryptoKey|password|pkcs8/);
  });
  it('says why a key file does not open', async () => {
    const client = new SignerClient(makePort());
    await expect(client.open(new Blob([file]), 'another')).rejects.toMatchObject({
      name: 'KeyFileError',
      code: 'wrong-password',
      message: 'The password does not open this file, or the file is damaged.',
    });
  });
  it('signs nothing before a key is open, nor after a later one failed to open', async () => {
    const client = new SignerClient(makePort());
    const prepared = await prepare(await makeBase(), ines);
    const ask = () => client.sign(prepared.bytes.slice().buffer, prepared.hole);
    await expect(ask()).rejects.toMatchObject({ name: 'SignerError', code: 'key-not-open' });
    await client.open(new Blob([file]), 'a password');
    await expect(client.open(new Blob([file]), 'another')).rejects.toMatchObject({ code: 'wrong-password' });
    await expect(ask()).rejects.toMatchObject({ code: 'key-not-open' });
  });
  it('signs only a file with an empty place for a signature', async () => {
    const client = new SignerClient(makePort());
    await client.open(new Blob([file]), 'a password');
    const { bytes, hole } = await prepare(await makeBase(), ines);
    for (const wrong of [
      { from: 0, to: 100 },
      { from: hole.from - 1, to: hole.to },
      { from: hole.from, to: 1e9 },
    ]) {
      await expect(client.sign(bytes.slice().buffer, wrong)).rejects.toMatchObject({
        code: 'file-not-prepared',
      });
    }
  });
  it('ends what was waiting when it closes', async () => {
    const client = new SignerClient({ ...makePort(), postMessage: () => undefined });
    const waiting = client.sign(new ArrayBuffer(8), { from: 1, to: 4 });
    client.close();
    await expect(waiting).rejects.toMatchObject({ name: 'SignerError' });
  });
});

it('what runs in the browser imports nothing of the server', () => {
  const seen = new Set<string>();
  const walk = (name: string) => {
    if (seen.has(name)) return;
    seen.add(name);
    const source = readFileSync(new URL(`../../lib/signing/${name}.ts`, import.meta.url), 'utf8');
    expect(source.startsWith('// server only'), name).toBe(false);
    expect(source, name).not.toMatch(/from 'node:|\bBuffer\b|process\.env/);
    for (const [, next] of source.matchAll(/(?:from|import\() ?'\.\/([\w.-]+)'/g)) walk(next as string);
  };
  walk('signer-client');
  walk('signer.worker');
  expect(seen.has('decrypt-legacy')).toBe(true);
});
