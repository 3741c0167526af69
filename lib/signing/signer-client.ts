import { KeyFileError } from './key-file-error';
import type { Hole } from './signed-part';
import type { SignerErrorCode, SignerReplies, SignerReply, SignerRequest } from './signer-messages';

/** Signing failed for another reason than the key file. */
export class SignerError extends Error {
  override readonly name = 'SignerError';
  constructor(
    readonly code: Exclude<SignerErrorCode, KeyFileError['code']>,
    sentence: string,
  ) {
    super(sentence);
  }
}

interface Waiting {
  readonly resolve: (result: never) => void;
  readonly reject: (error: Error) => void;
}

/** A worker, or anything that answers like one. */
export type SignerPort = Pick<Worker, 'postMessage' | 'addEventListener' | 'terminate'>;

/** A worker of its own, loaded only when somebody seals. */
export function startSignerWorker(): SignerPort {
  return new Worker(new URL('./signer.worker.ts', import.meta.url), { type: 'module', name: 'signer' });
}

/**
 * The page's side of the signing worker: open a key file, sign a prepared file, close. Rejects with KeyFileError or
 * SignerError. `close` ends the worker and with it the key; a closed client is not used again.
 */
export class SignerClient {
  private readonly waiting = new Map<number, Waiting>();
  private last = 0;

  constructor(private readonly port: SignerPort = startSignerWorker()) {
    port.addEventListener('message', (event) => this.settle((event as MessageEvent<SignerReply>).data));
    port.addEventListener('error', () =>
      this.failAll('The part of this page that signs could not be loaded.'),
    );
  }

  async open(file: Blob, password: string): Promise<SignerReplies['open']> {
    const bytes = await file.arrayBuffer();
    return this.ask({ do: 'open', file: bytes, password }, [bytes]);
  }

  /** `pdf`: the prepared file; it is handed to the worker and empty afterwards. `hole`: where its signature goes. */
  sign(pdf: ArrayBuffer, hole: Hole): Promise<SignerReplies['sign']> {
    return this.ask({ do: 'sign', pdf, hole }, [pdf]);
  }

  close(): void {
    this.port.terminate();
    this.failAll('The key was closed.');
  }

  private ask<Request extends SignerRequest>(
    request: Request,
    transfer: Transferable[],
  ): Promise<SignerReplies[Request['do']]> {
    const id = ++this.last;
    return new Promise((resolve, reject) => {
      this.waiting.set(id, { resolve, reject });
      this.port.postMessage({ ...request, id }, transfer);
    });
  }

  private settle(reply: SignerReply): void {
    const waiting = this.waiting.get(reply.id);
    this.waiting.delete(reply.id);
    if ('result' in reply) {
      waiting?.resolve(reply.result as never);
      return;
    }
    const { code, sentence } = reply.error;
    const own = code === 'unexpected' || code === 'key-not-open' || code === 'file-not-prepared';
    waiting?.reject(own ? new SignerError(code, sentence) : new KeyFileError(code));
  }

  private failAll(sentence: string): void {
    for (const { reject } of this.waiting.values()) reject(new SignerError('unexpected', sentence));
    this.waiting.clear();
  }
}
