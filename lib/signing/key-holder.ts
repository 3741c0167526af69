import { buildCms } from './build-cms';
import { type Bytes, toHex } from './bytes';
import { KeyFileError } from './key-file-error';
import { openKeyFile } from './open-key-file';
import { type Hole, signedPart } from './signed-part';
import type { CertificateFacts, Signer } from './signer';
import type { NumberedRequest, SignedReply, SignerErrorCode, SignerReply } from './signer-messages';

/** A refusal of the holder itself; errors of the key file are KeyFileError. */
class HolderError extends Error {
  constructor(
    readonly code: Exclude<SignerErrorCode, KeyFileError['code']>,
    sentence: string,
  ) {
    super(sentence);
  }
}

function checkHole(pdf: Bytes, { from, to }: Hole): void {
  const inside =
    Number.isInteger(from) && Number.isInteger(to) && 0 < from && from + 2 < to && to < pdf.length;
  const empty =
    inside &&
    pdf[from] === 0x3c &&
    pdf[to - 1] === 0x3e &&
    pdf.subarray(from + 1, to - 1).every((b) => b === 0x30);
  if (!empty)
    throw new HolderError('file-not-prepared', 'The file to be sealed has no empty place for a signature.');
}

/** Keeps one opened key, and signs prepared files with it. It lives in the signing worker; the key never leaves it. */
export class KeyHolder {
  private signer: Signer | undefined;

  /** Answers a request; never rejects. */
  async answer(request: NumberedRequest): Promise<SignerReply> {
    const { id } = request;
    try {
      if (request.do === 'open') return { id, result: await this.open(request.file, request.password) };
      if (request.do === 'sign')
        return { id, result: await this.sign(new Uint8Array(request.pdf), request.hole) };
      this.signer = undefined;
      return { id, result: null };
    } catch (cause) {
      if (cause instanceof KeyFileError || cause instanceof HolderError) {
        return { id, error: { code: cause.code, sentence: cause.message } };
      }
      return { id, error: { code: 'unexpected', sentence: `Signing failed: ${cause}` } };
    }
  }

  private async open(file: ArrayBuffer, password: string): Promise<CertificateFacts> {
    this.signer = undefined;
    const signer = await openKeyFile(new Uint8Array(file), password);
    this.signer = signer;
    const { holder, issuer, validFrom, validTo, usage } = signer;
    return { holder, issuer, validFrom, validTo, usage };
  }

  private async sign(pdf: Bytes, hole: Hole): Promise<SignedReply> {
    const { signer } = this;
    if (!signer) throw new HolderError('key-not-open', 'Open your key file first.');
    checkHole(pdf, hole);
    const part = signedPart(pdf, hole);
    const sha256 = toHex(new Uint8Array(await crypto.subtle.digest('SHA-256', part)));
    const digest = new Uint8Array(await crypto.subtle.digest(signer.hash, part));
    return { cms: await buildCms(digest, signer), sha256 };
  }
}
