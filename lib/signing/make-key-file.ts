// server only
import * as asn1js from 'asn1js';
import {
  Attribute,
  AuthenticatedSafe,
  CertBag,
  type Certificate,
  PFX,
  PKCS8ShroudedKeyBag,
  PrivateKeyInfo,
  SafeBag,
  SafeContents,
} from 'pkijs';
import type { Bytes } from './bytes';
import { oid } from './oid';

const iterations = { key: 100_000, mac: 10_000 };

/** Writes a PKCS #12 file: the key under PBES2 with AES-256, the certificates open, all under an HMAC of SHA-256. */
export async function makeKeyFile(
  key: CryptoKey,
  certificates: readonly Certificate[],
  password: string,
): Promise<Bytes> {
  const secret = new TextEncoder().encode(password).buffer;
  const pkcs8 = await crypto.subtle.exportKey('pkcs8', key);
  const id = () =>
    new Attribute({
      type: oid.localKeyId,
      values: [new asn1js.OctetString({ valueHex: new Uint8Array([1]) })],
    });
  const shrouded = new PKCS8ShroudedKeyBag({ parsedValue: PrivateKeyInfo.fromBER(pkcs8) });
  await shrouded.makeInternalValues({
    password: secret,
    contentEncryptionAlgorithm: { name: 'AES-CBC', length: 256 } as never,
    hmacHashAlgorithm: 'SHA-256',
    iterationCount: iterations.key,
  } as never);
  const keyBag = new SafeBag({ bagId: oid.shroudedKeyBag, bagValue: shrouded, bagAttributes: [id()] });
  const certificateBags = certificates.map(
    (certificate, i) =>
      new SafeBag({
        bagId: oid.certificateBag,
        bagValue: new CertBag({ parsedValue: certificate }),
        ...(i === 0 ? { bagAttributes: [id()] } : {}),
      }),
  );
  const open = (safeBags: SafeBag[]) => ({ privacyMode: 0, value: new SafeContents({ safeBags }) });
  const safe = new AuthenticatedSafe({
    parsedValue: { safeContents: [open([keyBag]), open(certificateBags)] },
  });
  await safe.makeInternalValues({ safeContents: [{}, {}] });
  const pfx = new PFX({ parsedValue: { integrityMode: 0, authenticatedSafe: safe } });
  await pfx.makeInternalValues({
    password: secret,
    iterations: iterations.mac,
    pbkdf2HashAlgorithm: 'SHA-256',
    hmacHashAlgorithm: 'SHA-256',
  });
  return new Uint8Array(pfx.toSchema().toBER());
}
