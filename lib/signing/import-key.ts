import * as asn1js from 'asn1js';
import { type Certificate, PrivateKeyInfo } from 'pkijs';
import type { Bytes } from './bytes';
import { KeyFileError } from './key-file-error';
import { type HashName, oid } from './oid';

const curves = new Map<string, { name: string; hash: HashName }>([
  [oid.p256, { name: 'P-256', hash: 'SHA-256' }],
  [oid.p384, { name: 'P-384', hash: 'SHA-384' }],
]);

/** A private key that Web Crypto will use and never give back. */
export interface SigningKey {
  readonly key: CryptoKey;
  readonly family: 'RSA' | 'EC';
  readonly hash: HashName;
  readonly importAs: RsaHashedImportParams | EcKeyImportParams;
  readonly signAs: { name: string; hash?: HashName };
}

function algorithms(info: PrivateKeyInfo): Omit<SigningKey, 'key'> {
  const { algorithmId, algorithmParams } = info.privateKeyAlgorithm;
  if (algorithmId === oid.rsaEncryption) {
    const name = 'RSASSA-PKCS1-v1_5';
    return { family: 'RSA', hash: 'SHA-256', importAs: { name, hash: 'SHA-256' }, signAs: { name } };
  }
  const curve =
    algorithmId === oid.ecPublicKey && algorithmParams instanceof asn1js.ObjectIdentifier
      ? curves.get(algorithmParams.valueBlock.toString())
      : undefined;
  if (!curve) throw new KeyFileError('unsupported-key', new Error(algorithmId));
  const { hash } = curve;
  return {
    family: 'EC',
    hash,
    importAs: { name: 'ECDSA', namedCurve: curve.name },
    signAs: { name: 'ECDSA', hash },
  };
}

/** Imports a PKCS #8 key as not extractable, and wipes the bytes it came from. */
export async function importKey(pkcs8: Bytes): Promise<SigningKey> {
  try {
    const how = algorithms(PrivateKeyInfo.fromBER(pkcs8));
    const key = await crypto.subtle.importKey('pkcs8', pkcs8, how.importAs, false, ['sign']);
    const bits = (key.algorithm as Partial<RsaKeyAlgorithm>).modulusLength;
    if (bits !== undefined && bits < 2048)
      throw new KeyFileError('unsupported-key', new Error(`RSA ${bits}`));
    return { key, ...how };
  } catch (cause) {
    throw cause instanceof KeyFileError ? cause : new KeyFileError('unsupported-key', cause);
  } finally {
    pkcs8.fill(0);
  }
}

/** Whether the certificate is the key's own: its public key must check a trial signature; names and labels prove nothing. */
export async function belongs(certificate: Certificate, signing: SigningKey): Promise<boolean> {
  const { algorithmId } = certificate.subjectPublicKeyInfo.algorithm;
  if (algorithmId !== (signing.family === 'RSA' ? oid.rsaEncryption : oid.ecPublicKey)) return false;
  const spki = certificate.subjectPublicKeyInfo.toSchema().toBER();
  const trial = crypto.getRandomValues(new Uint8Array(32));
  const signature = await crypto.subtle.sign(signing.signAs, signing.key, trial);
  try {
    const open = await crypto.subtle.importKey('spki', spki, signing.importAs, false, ['verify']);
    return await crypto.subtle.verify(signing.signAs, open, signature, trial);
  } catch {
    return false; // a key on another curve, so another's certificate
  }
}
