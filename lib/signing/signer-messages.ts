import type { Bytes } from './bytes';
import type { KeyFileCode } from './key-file-error';
import type { Hole } from './signed-part';
import type { CertificateFacts } from './signer';

/** What the page asks of the signing worker. Buffers are handed over, not copied. */
export type SignerRequest =
  | { readonly do: 'open'; readonly file: ArrayBuffer; readonly password: string }
  | { readonly do: 'sign'; readonly pdf: ArrayBuffer; readonly hole: Hole }
  | { readonly do: 'close' };

export interface SignedReply {
  /** The signature, in DER. */
  readonly cms: Bytes;
  /** What was signed, as the browser itself hashed it: SHA-256 of the prepared file without the hole, in hexadecimal. */
  readonly sha256: string;
}

export interface SignerReplies {
  readonly open: CertificateFacts;
  readonly sign: SignedReply;
  readonly close: null;
}

/** `key-not-open`: signing was asked before a key was open. `file-not-prepared`: the hole is not an empty one. */
export type SignerErrorCode = KeyFileCode | 'key-not-open' | 'file-not-prepared' | 'unexpected';

export type SignerReply =
  | { readonly id: number; readonly result: SignerReplies[keyof SignerReplies] }
  | { readonly id: number; readonly error: { readonly code: SignerErrorCode; readonly sentence: string } };

export type NumberedRequest = SignerRequest & { readonly id: number };
