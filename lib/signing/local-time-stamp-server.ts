// server only
import { createServer, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { answerTimeStamp } from './answer-time-stamp';
import { type Bytes, concat } from './bytes';
import type { Signer } from './signer';

export interface LocalTimeStampServer {
  readonly url: string;
  close(): Promise<void>;
}

const mostBytes = 4_096;

async function readBody(request: IncomingMessage): Promise<Bytes | undefined> {
  const parts: Uint8Array[] = [];
  let length = 0;
  for await (const part of request as AsyncIterable<Uint8Array>) {
    length += part.length;
    if (length > mostBytes) return undefined;
    parts.push(part);
  }
  return concat(parts);
}

/**
 * An RFC 3161 responder on loopback, for demonstration and tests: its clock is this computer's, and nobody vouches for it.
 * `port` 0 takes a free one; `onError` is given what went wrong inside.
 */
export function startLocalTimeStampServer(
  signer: Signer,
  {
    port = 0,
    now = () => new Date(),
    onError,
  }: { port?: number; now?: () => Date; onError?: (cause: unknown) => void } = {},
): Promise<LocalTimeStampServer> {
  const server = createServer((request, response) => {
    const answer = async () => {
      const body = request.method === 'POST' ? await readBody(request) : undefined;
      if (!body) {
        response.writeHead(request.method === 'POST' ? 413 : 405).end();
        return;
      }
      const reply = await answerTimeStamp(body, signer, now());
      response.writeHead(200, { 'content-type': 'application/timestamp-reply' }).end(reply);
    };
    answer().catch((cause) => {
      onError?.(cause);
      response.writeHead(500).end();
    });
  });
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => {
      resolve({
        url: `http://127.0.0.1:${(server.address() as AddressInfo).port}/`,
        close: () => new Promise((done) => server.close(() => done())),
      });
    });
  });
}
