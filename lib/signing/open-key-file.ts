import type { Bytes } from './bytes';
import { belongs, importKey } from './import-key';
import { KeyFileError } from './key-file-error';
import { makeSigner } from './make-signer';
import { maySeal } from './read-certificate';
import { readKeyFile } from './read-key-file';
import type { Signer } from './signer';

function check(signer: Signer, now: Date, suits: typeof maySeal): Signer {
  if (!suits(signer.certificate)) throw new KeyFileError('wrong-purpose');
  if (now < signer.validFrom) throw new KeyFileError('not-yet-valid');
  if (now > signer.validTo) throw new KeyFileError('expired');
  return signer;
}

/**
 * Opens a key file (PKCS #12) as a signer whose private key cannot be read out again. Runs in a browser, a worker or Node.
 * Of several keys the first that may be used today is taken; `suits` says what its certificate must be good for.
 * Throws KeyFileError.
 */
export async function openKeyFile(
  file: Bytes,
  password: string,
  { now = new Date(), suits = maySeal }: { now?: Date; suits?: typeof maySeal } = {},
): Promise<Signer> {
  const { keys, certificates } = await readKeyFile(file, password);
  let refusal = new KeyFileError('no-key');
  for (const pkcs8 of keys) {
    try {
      const signing = await importKey(pkcs8);
      for (const certificate of certificates) {
        if (!(await belongs(certificate, signing))) continue;
        return check(makeSigner(signing, certificate, certificates), now, suits);
      }
    } catch (cause) {
      if (!(cause instanceof KeyFileError)) throw cause;
      refusal = cause;
    }
  }
  throw refusal;
}
