import * as asn1js from 'asn1js';
import { CryptoEngine, type CryptoEngineDecryptParams } from 'pkijs';
import { KeyFileError } from './key-file-error';
import { oid } from './oid';

/** A key file states its own iteration count; more than this is no honest file but a way to stall the reader. */
export const mostIterations = 5_000_000;

/** Refuses absurd iteration counts before any work is done. */
export function limitIterations(node: unknown): void {
  if (node instanceof asn1js.Integer) {
    if (node.valueBlock.isHexOnly || node.valueBlock.valueDec > mostIterations) {
      throw new KeyFileError('unsupported-encryption', new Error('iteration count'));
    }
    return;
  }
  if (node instanceof asn1js.Sequence) for (const part of node.valueBlock.value) limitIterations(part);
}

function pbes2Cipher(parameters: unknown): string {
  const cipher = parameters instanceof asn1js.Sequence ? parameters.valueBlock.value[1] : undefined;
  const name = cipher instanceof asn1js.Sequence ? cipher.valueBlock.value[0] : undefined;
  return name instanceof asn1js.ObjectIdentifier ? name.valueBlock.toString() : '';
}

/** The engine pkijs decrypts through, with the old ciphers added. */
export class KeyFileEngine extends CryptoEngine {
  constructor(private readonly password: string) {
    super({ name: 'webcrypto', crypto: globalThis.crypto });
  }

  override async decryptEncryptedContentInfo(request: CryptoEngineDecryptParams): Promise<ArrayBuffer> {
    const { algorithmId, algorithmParams } = request.encryptedContentInfo.contentEncryptionAlgorithm;
    limitIterations(algorithmParams);
    if (algorithmId === oid.pbes2 && pbes2Cipher(algorithmParams).startsWith(oid.aesPrefix)) {
      try {
        return await super.decryptEncryptedContentInfo(request);
      } catch (cause) {
        throw new KeyFileError('wrong-password', cause);
      }
    }
    const { decryptLegacy, PaddingError } = await import('./decrypt-legacy');
    try {
      const data = new Uint8Array(request.encryptedContentInfo.getEncryptedContent());
      return decryptLegacy(algorithmId, new Uint8Array(algorithmParams.toBER()), this.password, data);
    } catch (cause) {
      throw new KeyFileError(
        cause instanceof PaddingError ? 'wrong-password' : 'unsupported-encryption',
        cause,
      );
    }
  }
}
