import * as asn1js from 'asn1js';
import type { PFX } from 'pkijs';
import type { Bytes } from './bytes';
import { type KeyFileEngine, limitIterations, mostIterations } from './key-file-engine';
import { KeyFileError } from './key-file-error';
import { oid } from './oid';

type MacData = NonNullable<PFX['macData']>;

function sequence(node: unknown): asn1js.BaseBlock[] {
  if (!(node instanceof asn1js.Sequence)) throw new KeyFileError('not-a-key-file');
  return node.valueBlock.value;
}

function identifier(node: unknown): string {
  const first = sequence(node)[0];
  if (!(first instanceof asn1js.ObjectIdentifier)) throw new KeyFileError('not-a-key-file');
  return first.valueBlock.toString();
}

function integer(node: unknown): number {
  if (!(node instanceof asn1js.Integer)) throw new KeyFileError('not-a-key-file');
  return node.valueBlock.valueDec;
}

/** PBMAC1 (RFC 9579): PBKDF2 makes the key, HMAC the code; both are in Web Crypto. */
async function pbmac1(engine: KeyFileEngine, mac: MacData['mac'], content: BufferSource, password: Bytes) {
  const [derivation, scheme] = sequence(mac.digestAlgorithm.algorithmParams);
  limitIterations(derivation);
  const [salt, iterations, length, last] = sequence(sequence(derivation)[1]);
  if (!(salt instanceof asn1js.OctetString)) throw new KeyFileError('not-a-key-file');
  const prf = last ? engine.getAlgorithmByOID<HmacKeyGenParams>(identifier(last), true).hash : 'SHA-1';
  const base = await engine.subtle.importKey('raw', password, 'PBKDF2', false, ['deriveBits']);
  const how = {
    name: 'PBKDF2',
    hash: prf,
    salt: new Uint8Array(salt.valueBlock.valueHexView),
    iterations: integer(iterations),
  };
  const bits = await engine.subtle.deriveBits(how, base, integer(length) * 8);
  const hmac = engine.getAlgorithmByOID<HmacKeyGenParams>(identifier(scheme), true);
  const key = await engine.subtle.importKey('raw', bits, hmac, false, ['verify']);
  return engine.subtle.verify('HMAC', key, new Uint8Array(mac.digest.valueBlock.valueHexView), content);
}

/** Checks the code that binds a key file to its password. A file without one is let pass: its padding tells. */
export async function checkKeyFileMac(pfx: PFX, password: Bytes, engine: KeyFileEngine): Promise<void> {
  const data = pfx.macData;
  if (!data) return;
  const content = new Uint8Array((pfx.authSafe.content as asn1js.OctetString).getValue());
  const { mac } = data;
  if (mac.digestAlgorithm.algorithmId === oid.pbmac1) {
    if (!(await pbmac1(engine, mac, content, password))) throw new KeyFileError('wrong-password');
    return;
  }
  const iterations = data.iterations ?? 1;
  // pkijs reads a count of more than three bytes as 0.
  if (iterations === 0 || iterations > mostIterations) throw new KeyFileError('unsupported-encryption');
  const hash = engine.getAlgorithmByOID(mac.digestAlgorithm.algorithmId);
  if (!('name' in hash)) throw new KeyFileError('unsupported-encryption');
  const right = await engine.verifyDataStampedWithPassword({
    password: password.buffer,
    hashAlgorithm: String(hash.name),
    salt: new Uint8Array(data.macSalt.valueBlock.valueHexView).buffer,
    iterationCount: iterations,
    contentToVerify: content.buffer,
    signatureToVerify: new Uint8Array(mac.digest.valueBlock.valueHexView).buffer,
  });
  if (!right) throw new KeyFileError('wrong-password');
}
