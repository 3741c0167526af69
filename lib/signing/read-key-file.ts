import {
  type CertBag,
  Certificate,
  PFX,
  type PKCS8ShroudedKeyBag,
  PrivateKeyInfo,
  type SafeContents,
} from 'pkijs';
import type { Bytes } from './bytes';
import { checkKeyFileMac } from './check-key-file-mac';
import { KeyFileEngine } from './key-file-engine';
import { KeyFileError } from './key-file-error';
import { oid } from './oid';

/** What a key file holds, decrypted. The caller wipes `keys` (PKCS #8) once they are imported. */
export interface KeyFileContents {
  readonly keys: readonly Bytes[];
  readonly certificates: readonly Certificate[];
}

function parse(file: Bytes): PFX {
  try {
    const pfx = PFX.fromBER(file);
    if (pfx.authSafe.contentType === oid.data) return pfx;
  } catch (cause) {
    throw new KeyFileError('not-a-key-file', cause);
  }
  throw new KeyFileError(
    'unsupported-encryption',
    new Error('sealed with a public key, not with a password'),
  );
}

async function decrypt(pfx: PFX, password: Bytes, engine: KeyFileEngine): Promise<KeyFileContents> {
  const secret = { password: password.buffer };
  await pfx.parseInternalValues({ checkIntegrity: false, ...secret });
  const safe = pfx.parsedValue?.authenticatedSafe;
  if (!safe) throw new KeyFileError('not-a-key-file');
  await safe.parseInternalValues({ safeContents: safe.safeContents.map(() => secret) }, engine);
  const contents: { value: SafeContents }[] = safe.parsedValue.safeContents;
  const keys: Bytes[] = [];
  const certificates: Certificate[] = [];
  for (const bag of contents.flatMap(({ value }) => value.safeBags)) {
    if (bag.bagId === oid.certificateBag) {
      const held: unknown = (bag.bagValue as CertBag).parsedValue;
      if (held instanceof Certificate) certificates.push(held);
    } else if (bag.bagId === oid.shroudedKeyBag) {
      const shrouded = bag.bagValue as PKCS8ShroudedKeyBag & {
        parseInternalValues(parameters: typeof secret, engine: KeyFileEngine): Promise<void>;
      };
      await shrouded.parseInternalValues(secret, engine);
      if (shrouded.parsedValue) keys.push(new Uint8Array(shrouded.parsedValue.toSchema().toBER()));
    } else if (bag.bagId === oid.keyBag && bag.bagValue instanceof PrivateKeyInfo) {
      keys.push(new Uint8Array(bag.bagValue.toSchema().toBER()));
    }
  }
  return { keys, certificates };
}

/** Opens a PKCS #12 file (RFC 7292). Throws KeyFileError. */
export async function readKeyFile(file: Bytes, password: string): Promise<KeyFileContents> {
  const pfx = parse(file);
  const secret = new TextEncoder().encode(password);
  const engine = new KeyFileEngine(password);
  try {
    await checkKeyFileMac(pfx, secret, engine);
  } catch (cause) {
    throw cause instanceof KeyFileError ? cause : new KeyFileError('unsupported-encryption', cause);
  }
  try {
    return await decrypt(pfx, secret, engine);
  } catch (cause) {
    // Without a code over the file, a wrong password can decrypt to nonsense that does not parse.
    throw cause instanceof KeyFileError ? cause : new KeyFileError('wrong-password', cause);
  }
}
