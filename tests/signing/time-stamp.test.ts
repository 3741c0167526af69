import { readFileSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { SignedAndUnsignedAttributes } from 'pkijs';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { answerTimeStamp } from '@/lib/signing/answer-time-stamp';
import type { Bytes } from '@/lib/signing/bytes';
import { readPem } from '@/lib/signing/certificate-pem';
import { checkTimeStamp } from '@/lib/signing/check-time-stamp';
import { startLocalTimeStampServer } from '@/lib/signing/local-time-stamp-server';
import type { Signer } from '@/lib/signing/signer';
import { fetchTimeStamp } from '@/lib/signing/time-stamp';
import { keyOf, type Office, openOffice, tomas } from './office';
import { editCms } from './tamper';

let office: Office;
let stamper: Signer;
const data = new TextEncoder().encode('a signature');
const open: Server[] = [];
beforeAll(async () => {
  office = await openOffice();
  stamper = await office.authority.issueTimeStamper();
});
afterAll(() => office.stamps.close());
afterEach(() => {
  for (const server of open.splice(0)) server.close();
});

/** A service that misbehaves in one way. */
async function serve(
  answer: (request: Bytes) => Promise<Uint8Array> | Uint8Array,
  status = 200,
): Promise<string> {
  const server = createServer(async (request, response) => {
    const parts: Buffer[] = [];
    for await (const part of request as AsyncIterable<Buffer>) parts.push(part);
    response.writeHead(status).end(await answer(new Uint8Array(Buffer.concat(parts))));
  });
  open.push(server);
  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}/`;
}

const code = async (url: string) => {
  try {
    const service = { url, anchors: office.trust.stampAnchors, timeout: 1000 };
    return (await fetchTimeStamp(service, data)).stamp.authority;
  } catch (cause) {
    return (cause as { code?: string }).code;
  }
};

/** Tokens made by OpenSSL 3.0 (`openssl ts -reply`) over the words "a signature". */
describe('a time stamp OpenSSL made', () => {
  const sample = (name: string) => readFileSync(new URL(`./time-stamps/${name}`, import.meta.url));
  const anchors = readPem(sample('root.pem').toString());

  it.each(['token-sha1.der', 'token-sha256.der'])('is read and trusted: %s', async (name) => {
    const stamp = await checkTimeStamp(new Uint8Array(sample(name)), data, anchors);
    expect(stamp).toMatchObject({ authority: 'Sample stamps', time: new Date('2026-12-01T09:19:38Z') });
  });
  it('is refused with an attribute nobody signed', async () => {
    const token = editCms(new Uint8Array(sample('token-sha256.der')), ({ signerInfos: [own] }) => {
      if (own?.signedAttrs)
        own.unsignedAttrs = new SignedAndUnsignedAttributes({
          type: 1,
          attributes: own.signedAttrs.attributes,
        });
    });
    await expect(checkTimeStamp(token, data, anchors)).rejects.toMatchObject({ code: 'time-stamp-wrong' });
  });
  it('is refused over other words', async () => {
    const token = new Uint8Array(sample('token-sha256.der'));
    await expect(checkTimeStamp(token, new Uint8Array(3), anchors)).rejects.toMatchObject({
      code: 'time-stamp-wrong',
    });
  });
});

it('stamps the signature, by a service the office trusts', async () => {
  expect(await code(office.stamps.url)).toBe('Orrin demo time stamps');
});

describe('accepts no stamp from a service that', () => {
  it('is not there, fails, or answers with a page', async () => {
    expect(await code('http://127.0.0.1:9/')).toBe('time-stamp-unavailable');
    expect(await code(await serve(() => new Uint8Array(0), 500))).toBe('time-stamp-unavailable');
    expect(await code(await serve(() => new TextEncoder().encode('<html>sign in</html>')))).toBe(
      'time-stamp-unavailable',
    );
  });
  it('does not answer in time', async () => {
    const never = await serve(() => new Promise((done) => setTimeout(() => done(new Uint8Array(0)), 2500)));
    expect(await code(never)).toBe('time-stamp-unavailable');
  });
  it('rejects the request', async () => {
    expect(await code(await serve(() => answerTimeStamp(new Uint8Array(0), stamper, new Date())))).toBe(
      'time-stamp-refused',
    );
  });
  it('answers with an earlier stamp', async () => {
    let kept: Bytes | undefined;
    const url = await serve(async (request) => {
      kept ??= await answerTimeStamp(request, stamper, new Date());
      return kept;
    });
    expect(await code(url)).toBe('Orrin demo time stamps');
    expect(await code(url)).toBe('time-stamp-wrong');
  });
  it('has another clock', async () => {
    const hourAhead = await startLocalTimeStampServer(stamper, {
      now: () => new Date(Date.now() + 3_600_000),
    });
    expect(await code(hourAhead.url)).toBe('time-stamp-wrong');
    await hourAhead.close();
  });
  it('signs with a certificate that is not for time stamps', async () => {
    const engineer = await keyOf(office, tomas);
    const url = await serve((request) => answerTimeStamp(request, engineer, new Date()));
    expect(await code(url)).toBe('certificate-purpose');
  });
  it('comes from an authority nobody chose', async () => {
    const stranger = await openOffice();
    expect(await code(stranger.stamps.url)).toBe('certificate-unknown');
    await stranger.stamps.close();
  });
});

it('the demonstration service answers only requests it can read', async () => {
  expect((await fetch(office.stamps.url)).status).toBe(405);
  expect((await fetch(office.stamps.url, { method: 'POST', body: 'x'.repeat(5000) })).status).toBe(413);
});
