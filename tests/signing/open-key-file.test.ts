import { createHmac, pbkdf2Sync } from 'node:crypto';
import { readFileSync } from 'node:fs';
import * as asn1js from 'asn1js';
import forge from 'node-forge';
import { ContentInfo, PFX } from 'pkijs';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Bytes } from '@/lib/signing/bytes';
import { type DemoAuthority, makeDemoAuthority } from '@/lib/signing/demo-authority';
import { importKey } from '@/lib/signing/import-key';
import { openKeyFile } from '@/lib/signing/open-key-file';
import { readKeyFile } from '@/lib/signing/read-key-file';

/** Key files written by OpenSSL 3.0; the names in them are invented. */
const sample = (name: string): Bytes =>
  new Uint8Array(readFileSync(new URL(`./key-files/${name}.p12`, import.meta.url)));
const password = 'correct horse';

describe('a key file written by OpenSSL opens', () => {
  it.each([
    ['with its defaults, RSA', 'rsa-default', password, 'RSA', 'SHA-256'],
    ['with its defaults, P-256', 'p256-default', password, 'EC', 'SHA-256'],
    ['with its defaults, P-384', 'p384-default', password, 'EC', 'SHA-384'],
    ['in the old way, RC2 and 3DES', 'rsa-legacy', password, 'RSA', 'SHA-256'],
    ['with 3DES throughout', 'rsa-3des', password, 'RSA', 'SHA-256'],
    ['with 3DES under PBES2', 'rsa-3des-pbes2', password, 'RSA', 'SHA-256'],
    ['with AES-128 and a code of SHA-512', 'rsa-aes128-sha512', password, 'RSA', 'SHA-256'],
    ['without a code over the file', 'rsa-no-mac', password, 'RSA', 'SHA-256'],
    ['with letters beyond ASCII in its password', 'rsa-umlaut', 'Straße€ 12', 'RSA', 'SHA-256'],
    ['in the old way with letters beyond ASCII', 'rsa-umlaut-legacy', 'Straße€ 12', 'RSA', 'SHA-256'],
    ['with an empty password', 'rsa-empty-password', '', 'RSA', 'SHA-256'],
  ])('%s', async (_, name, secret, family, hash) => {
    const signer = await openKeyFile(sample(name), secret);
    expect(signer).toMatchObject({ family, hash, issuer: 'Orrin key file samples' });
    expect(signer.holder).toEqual({ name: 'Ada Sample', licenceNumber: 'OR-00001', organization: 'Sample' });
    expect(signer.usage).toEqual(['email-protection', 'document-signing']);
  });
});

/** RFC 9579: HMAC under a PBKDF2 key, both by node:crypto here and by Web Crypto in what is tested. */
function withPbmac1(file: Bytes, secret: string): Bytes {
  const pfx = PFX.fromBER(file);
  const content = Buffer.from((pfx.authSafe.content as asn1js.OctetString).getValue());
  const salt = Buffer.from('0f1e2d3c4b5a6978', 'hex');
  const id = (value: string) => new asn1js.ObjectIdentifier({ value });
  const algorithm = (value: string, ...more: asn1js.BaseBlock[]) =>
    new asn1js.Sequence({ value: [id(value), ...more] });
  const hmacSha256 = () => algorithm('1.2.840.113549.2.9', new asn1js.Null());
  const derivation = new asn1js.Sequence({
    value: [
      new asn1js.OctetString({ valueHex: new Uint8Array(salt) }),
      new asn1js.Integer({ value: 2048 }),
      new asn1js.Integer({ value: 32 }),
      hmacSha256(),
    ],
  });
  const code = createHmac('sha256', pbkdf2Sync(secret, salt, 2048, 32, 'sha256'))
    .update(content)
    .digest();
  const parameters = new asn1js.Sequence({
    value: [algorithm('1.2.840.113549.1.5.12', derivation), hmacSha256()],
  });
  const mac = new asn1js.Sequence({
    value: [
      new asn1js.Sequence({
        value: [
          algorithm('1.2.840.113549.1.5.14', parameters),
          new asn1js.OctetString({ valueHex: new Uint8Array(code) }),
        ],
      }),
      new asn1js.OctetString({ valueHex: new Uint8Array(salt) }),
      new asn1js.Integer({ value: 1 }),
    ],
  });
  const authSafe = new ContentInfo({ contentType: pfx.authSafe.contentType, content: pfx.authSafe.content });
  const whole = new asn1js.Sequence({ value: [new asn1js.Integer({ value: 3 }), authSafe.toSchema(), mac] });
  return new Uint8Array(whole.toBER());
}

it('opens a key file whose code is PBMAC1, and refuses it under another password', async () => {
  const file = withPbmac1(sample('rsa-no-mac'), password);
  expect((await openKeyFile(file, password)).family).toBe('RSA');
  await expect(openKeyFile(withPbmac1(sample('rsa-no-mac'), 'x'), password)).rejects.toMatchObject({
    code: 'wrong-password',
  });
});

it('opens a key file that another library wrote', async () => {
  const keys = forge.pki.rsa.generateKeyPair(2048);
  const certificate = forge.pki.createCertificate();
  certificate.publicKey = keys.publicKey;
  certificate.serialNumber = '0451';
  certificate.validity.notBefore = new Date(Date.now() - 86_400_000);
  certificate.validity.notAfter = new Date(Date.now() + 86_400_000);
  certificate.setSubject([{ name: 'commonName', value: 'Ada Sample' }]);
  certificate.setIssuer([{ name: 'commonName', value: 'Ada Sample' }]);
  certificate.sign(keys.privateKey, forge.md.sha256.create());
  const asn1 = forge.pkcs12.toPkcs12Asn1(keys.privateKey, [certificate], 'päss', { algorithm: '3des' });
  const file = Uint8Array.from(forge.asn1.toDer(asn1).getBytes(), (c) => c.charCodeAt(0));
  const signer = await openKeyFile(file, 'päss');
  expect(signer.holder.name).toBe('Ada Sample');
  expect(signer.usage).toEqual(['any']);
});

describe('a key file is refused with its own code', () => {
  let authority: DemoAuthority;
  const day = 86_400_000;
  const at = (days: number) => new Date(Date.now() + days * day);
  const who = { name: 'Ada Sample', licenceNumber: 'OR-00001', key: 'P-256' } as const;
  beforeAll(async () => {
    authority = await makeDemoAuthority();
  });

  it.each(['rsa-default', 'rsa-legacy', 'rsa-no-mac', 'rsa-3des-pbes2', 'p384-default'])(
    'under another password: %s',
    async (name) => {
      await expect(openKeyFile(sample(name), 'incorrect horse')).rejects.toMatchObject({
        code: 'wrong-password',
      });
    },
  );
  it.each([
    ['not-a-key-file', new TextEncoder().encode('-----BEGIN CERTIFICATE-----\n')],
    ['not-a-key-file', new Uint8Array(0)],
    ['not-a-key-file', new TextEncoder().encode('%PDF-1.7 and more of the like')],
    ['not-a-key-file', sample('rsa-default').subarray(0, 2000)],
    ['no-key', sample('no-key')],
    ['unsupported-encryption', sample('rsa-rc4')],
    ['unsupported-key', sample('weak-rsa1024')],
    ['unsupported-key', sample('brainpool')],
    ['unsupported-key', sample('ed25519')],
  ] as [string, Bytes][])('%s', async (code, file) => {
    await expect(openKeyFile(new Uint8Array(file), password)).rejects.toMatchObject({
      name: 'KeyFileError',
      code,
    });
  });
  it('expired', async () => {
    const { file } = await authority.issueKeyFile({ ...who, validFrom: at(-30), validTo: at(-1) }, password);
    await expect(openKeyFile(file, password)).rejects.toMatchObject({ code: 'expired' });
    expect((await openKeyFile(file, password, { now: at(-2) })).holder.name).toBe('Ada Sample');
  });
  it('not yet valid', async () => {
    const { file } = await authority.issueKeyFile({ ...who, validFrom: at(2), validTo: at(30) }, password);
    await expect(openKeyFile(file, password)).rejects.toMatchObject({ code: 'not-yet-valid' });
  });
  it('issued for another purpose', async () => {
    const { file } = await authority.issueTimeStampKeyFile(password);
    await expect(openKeyFile(file, password)).rejects.toMatchObject({ code: 'wrong-purpose' });
  });
  it('with an absurd iteration count, before any work is done', async () => {
    const file = sample('rsa-default');
    const pfx = PFX.fromBER(file);
    if (!pfx.macData) throw new Error('the sample has a code');
    // Were the work done, it would outlast the test by hours.
    pfx.macData.iterations = 2_000_000_000;
    const stalled = openKeyFile(new Uint8Array(pfx.toSchema().toBER()), password);
    await expect(stalled).rejects.toMatchObject({ code: 'unsupported-encryption' });
  });
});

it('imports a private key that cannot be read out again, and wipes the bytes it came from', async () => {
  const { keys } = await readKeyFile(sample('rsa-default'), password);
  const [pkcs8] = keys as [Bytes];
  const { key } = await importKey(pkcs8);
  expect(key.extractable).toBe(false);
  await expect(crypto.subtle.exportKey('pkcs8', key)).rejects.toThrow();
  await expect(crypto.subtle.exportKey('jwk', key)).rejects.toThrow();
  expect(pkcs8.every((byte) => byte === 0)).toBe(true);
});
