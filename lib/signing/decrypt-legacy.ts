import forge from 'node-forge/lib/forge.js';
import 'node-forge/lib/pbe.js';

/** The decrypted bytes do not end as the cipher's padding must: the password is wrong. */
export class PaddingError extends Error {}

function toBinary(bytes: Uint8Array): string {
  let text = '';
  for (let i = 0; i < bytes.length; i += 8192) text += String.fromCharCode(...bytes.subarray(i, i + 8192));
  return text;
}

/**
 * Old password-based encryption of key files: 3DES and RC2 under the PKCS #12 derivation (RFC 7292, appendix B), 3DES
 * under PBES2. Web Crypto has none of them, so this module is loaded only when a file needs it.
 * Throws PaddingError for a wrong password, any other error for a cipher it does not know.
 */
export function decryptLegacy(
  algorithm: string,
  parameters: Uint8Array,
  password: string,
  data: Uint8Array,
): ArrayBuffer {
  // PBES2 takes the password as UTF-8, the PKCS #12 derivation as UTF-16.
  const secret = algorithm === forge.pki.oids.pkcs5PBES2 ? forge.util.encodeUtf8(password) : password;
  const cipher = forge.pki.pbe.getCipher(algorithm, forge.asn1.fromDer(toBinary(parameters)), secret);
  cipher.update(forge.util.createBuffer(toBinary(data)));
  if (!cipher.finish()) throw new PaddingError('padding');
  const plain = Uint8Array.from(cipher.output.getBytes(), (character) => character.charCodeAt(0));
  return plain.buffer;
}
