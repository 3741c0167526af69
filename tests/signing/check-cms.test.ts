import { CertificateRevocationList } from 'pkijs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Bytes } from '@/lib/signing/bytes';
import { checkCms } from '@/lib/signing/check-cms';
import type { Trust } from '@/lib/signing/check-signature';
import { type Issuer, makeCertificate } from '@/lib/signing/make-certificate';
import { type MadeKey, makeKey } from '@/lib/signing/make-key';
import { makeSigner } from '@/lib/signing/make-signer';
import { openKeyFile } from '@/lib/signing/open-key-file';
import { mayStampTime } from '@/lib/signing/read-certificate';
import { signedPart } from '@/lib/signing/signed-part';
import type { Signer } from '@/lib/signing/signer';
import { stampSignature } from '@/lib/signing/time-stamp';
import { ines, keyOf, makeBase, type Office, openOffice, prepare, sign, tomas } from './office';
import { editCms } from './tamper';

let office: Office;
let key: Signer;
let content: Bytes;
let cms: Bytes;
const now = new Date();
const later = (days: number) => new Date(+now + days * 86_400_000);
beforeAll(async () => {
  office = await openOffice();
  key = await keyOf(office, ines);
  const prepared = await prepare(await makeBase(), ines);
  content = signedPart(prepared.bytes, prepared.hole);
  cms = await sign(prepared, key);
});
afterAll(() => office.stamps.close());

const code = async (
  bytes: Bytes,
  { who = ines, at = now, trust = office.trust as Trust, of = content } = {},
) => {
  try {
    return (await checkCms(bytes, of, who, trust, at)).holder.name;
  } catch (cause) {
    return (cause as { code?: string }).code ?? String(cause);
  }
};

it('accepts the signature of the person who was to sign', async () => {
  expect(await code(cms)).toBe(ines.name);
});

describe('refuses with its own code', () => {
  it('another person, another licence number, another spelling', async () => {
    expect(await code(cms, { who: tomas })).toBe('another-person');
    expect(await code(cms, { who: { ...ines, licenceNumber: 'OR-20418' } })).toBe('another-person');
    expect(await code(cms, { who: { ...ines, name: 'Ines Ornsund' } })).toBe('another-person');
  });
  it('a signature over other content', async () => {
    expect(await code(cms, { of: content.subarray(1) })).toBe('content-changed');
  });
  it('a certificate expired, or not yet valid, at the server’s clock', async () => {
    expect(await code(cms, { at: later(2000) })).toBe('certificate-expired');
    expect(await code(cms, { at: later(-2) })).toBe('certificate-not-yet-valid');
  });
  it('a certificate that is not for documents', async () => {
    const { file } = await office.authority.issueTimeStampKeyFile('x');
    const stamper = await openKeyFile(file, 'x', { suits: mayStampTime });
    const prepared = await prepare(await makeBase(), ines);
    const made = await sign(prepared, stamper);
    expect(await code(made, { of: signedPart(prepared.bytes, prepared.hole) })).toBe('certificate-purpose');
  });
  it('an authority nobody chose', async () => {
    expect(await code(cms, { trust: { ...office.trust, anchors: [] } })).toBe('certificate-unknown');
  });
  it('a self-signed root brought along', async () => {
    const stranger = await openOffice();
    await stranger.stamps.close();
    const brought = editCms(cms, (data) => data.certificates?.push(stranger.authority.certificate));
    expect(await code(brought)).toBe('certificate-unknown');
  });
  it('a revoked certificate, and a list that is out of date', async () => {
    const list = async (revoked: boolean, at: Date) => {
      const entries = revoked ? [{ certificate: key.certificate, at: later(-0.5) }] : [];
      return [CertificateRevocationList.fromBER(await office.authority.listRevoked(entries, at))];
    };
    const withList = async (revoked: boolean, at: Date) => ({
      trust: { ...office.trust, crls: await list(revoked, at) },
    });
    expect(await code(cms, await withList(true, later(-0.1)))).toBe('certificate-revoked');
    expect(await code(cms, await withList(false, later(-0.1)))).toBe(ines.name);
    expect(await code(cms, await withList(false, later(-30)))).toBe('revocation-unknown');
  });
  it('a list of revoked certificates that the authority did not sign', async () => {
    const stranger = await openOffice();
    await stranger.stamps.close();
    const forged = CertificateRevocationList.fromBER(await stranger.authority.listRevoked([], later(-0.1)));
    expect(await code(cms, { trust: { ...office.trust, crls: [forged] } })).toBe('revocation-unknown');
  });
  it('a signature that is stamped already', async () => {
    const service = { url: office.stamps.url, anchors: office.trust.stampAnchors };
    expect(await code((await stampSignature(cms, service)).cms)).toBe('time-stamp-wrong');
  });
  it('what is no signature at all, or has bytes after it', async () => {
    expect(await code(new Uint8Array(0))).toBe('not-a-signature');
    expect(await code(new Uint8Array([0x30, 3, 2, 1, 1]))).toBe('not-a-signature');
    expect(await code(new Uint8Array([...cms, 0]))).toBe('not-a-signature');
  });
  it('a signature made with another key than its certificate’s', async () => {
    const other = await keyOf(office, tomas);
    const crossed = {
      ...makeSigner({} as never, key.certificate),
      family: other.family,
      hash: other.hash,
      sign: other.sign,
    };
    const prepared = await prepare(await makeBase(), ines);
    const made = await sign(prepared, crossed);
    expect(await code(made, { of: signedPart(prepared.bytes, prepared.hole) })).toBe('signature-wrong');
  });
  it('an authority under one that may have none under it', async () => {
    const valid = { validFrom: later(-1), validTo: later(10) };
    const [root, middle, own] = [await makeKey('P-256'), await makeKey('P-256'), await makeKey('P-256')];
    const authority = (name: string, { publicKey }: MadeKey, issuer: Issuer) =>
      makeCertificate({ role: 'authority', name, publicKey, ...valid }, issuer);
    const top = await authority('Top register', root, { key: root });
    const under = await authority('Under register', middle, { certificate: top, key: root });
    const person = { role: 'documents', ...ines, publicKey: own.publicKey, ...valid } as const;
    const leaf = await makeCertificate(person, { certificate: under, key: middle });
    const prepared = await prepare(await makeBase(), ines);
    const made = await sign(prepared, makeSigner(own, leaf, [under]));
    const of = signedPart(prepared.bytes, prepared.hole);
    expect(await code(made, { of, trust: { ...office.trust, anchors: [top] } })).toBe('certificate-unknown');
    expect(await code(made, { of, trust: { ...office.trust, anchors: [under] } })).toBe(ines.name);
  });
  it('a key that is too short', async () => {
    const importAs = { name: 'RSASSA-PKCS1-v1_5', hash: 'SHA-256' };
    const shape = { ...importAs, modulusLength: 1024, publicExponent: new Uint8Array([1, 0, 1]) };
    const pair = await crypto.subtle.generateKey(shape, true, ['sign', 'verify']);
    const root = await makeKey('P-256');
    const valid = { validFrom: later(-1), validTo: later(10) };
    const top = await makeCertificate(
      { role: 'authority', name: 'Top register', publicKey: root.publicKey, ...valid },
      { key: root },
    );
    const leaf = await makeCertificate(
      { role: 'documents', ...ines, publicKey: pair.publicKey, ...valid },
      { certificate: top, key: root },
    );
    const short = {
      key: pair.privateKey,
      family: 'RSA',
      hash: 'SHA-256',
      importAs,
      signAs: { name: importAs.name },
    } as const;
    const prepared = await prepare(await makeBase(), ines);
    const made = await sign(prepared, makeSigner(short, leaf));
    const trust = { ...office.trust, anchors: [top] };
    expect(await code(made, { of: signedPart(prepared.bytes, prepared.hole), trust })).toBe('weak-algorithm');
  });
  it('a weak hash', async () => {
    const weak = editCms(cms, ({ signerInfos, digestAlgorithms }) => {
      for (const { digestAlgorithm } of signerInfos) digestAlgorithm.algorithmId = '1.3.14.3.2.26';
      for (const algorithm of digestAlgorithms) algorithm.algorithmId = '1.3.14.3.2.26';
    });
    expect(await code(weak)).toBe('weak-algorithm');
  });
});

it('accepts no signature with one bit of it changed', { timeout: 60_000 }, async () => {
  // Every thirteenth bit: each kind of field in the structure is met many times.
  const accepted: number[] = [];
  for (let bit = 0; bit < cms.length * 8; bit += 13) {
    const damaged = new Uint8Array(cms);
    damaged[bit >> 3] = (damaged[bit >> 3] as number) ^ (1 << (bit & 7));
    if ((await code(damaged)) === ines.name) accepted.push(bit);
  }
  expect(accepted).toEqual([]);
});
