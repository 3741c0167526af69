// server only
import type { SigningKey } from './import-key';

export type KeyKind = 'RSA-2048' | 'RSA-3072' | 'P-256' | 'P-384';

/** A fresh pair: the private half can be exported, since it goes into a key file. */
export interface MadeKey extends SigningKey {
  readonly publicKey: CryptoKey;
}

const hashes = { 'P-256': 'SHA-256', 'P-384': 'SHA-384' } as const;

export async function makeKey(kind: KeyKind): Promise<MadeKey> {
  if (kind === 'P-256' || kind === 'P-384') {
    const importAs = { name: 'ECDSA', namedCurve: kind };
    const pair = await crypto.subtle.generateKey(importAs, true, ['sign', 'verify']);
    const hash = hashes[kind];
    const signAs = { name: 'ECDSA', hash };
    return { key: pair.privateKey, publicKey: pair.publicKey, family: 'EC', hash, importAs, signAs };
  }
  const importAs = { name: 'RSASSA-PKCS1-v1_5', hash: 'SHA-256' };
  const shape = {
    ...importAs,
    modulusLength: kind === 'RSA-2048' ? 2048 : 3072,
    publicExponent: new Uint8Array([1, 0, 1]),
  };
  const pair = await crypto.subtle.generateKey(shape, true, ['sign', 'verify']);
  const signAs = { name: importAs.name };
  return {
    key: pair.privateKey,
    publicKey: pair.publicKey,
    family: 'RSA',
    hash: 'SHA-256',
    importAs,
    signAs,
  };
}
