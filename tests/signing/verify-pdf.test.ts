import { degrees, PDFArray, PDFDict, PDFName, PDFRef, PDFString } from '@cantoo/pdf-lib';
import * as asn1js from 'asn1js';
import { Certificate, CertificateRevocationList, EncapsulatedContentInfo, type SignedData } from 'pkijs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Bytes } from '@/lib/signing/bytes';
import { insertSignature } from '@/lib/signing/insert-signature';
import { makeCertificate } from '@/lib/signing/make-certificate';
import { makeKey } from '@/lib/signing/make-key';
import { makeSigner } from '@/lib/signing/make-signer';
import type { Signer } from '@/lib/signing/signer';
import { stampSignature } from '@/lib/signing/time-stamp';
import { type VerifyOptions, verifyPdf } from '@/lib/signing/verify-pdf';
import { ines, keyOf, makeBase, type Office, openOffice, prepare, seal, sign, tomas } from './office';
import { addNote, append, appendObjects, drawOver, editCms, lastCms, withCms } from './tamper';

let office: Office;
let key: Signer;
let base: Bytes;
let once: Bytes;
let twice: Bytes;
beforeAll(async () => {
  office = await openOffice();
  key = await keyOf(office, ines);
  base = await makeBase();
  once = await seal(office, base, ines, key);
  twice = await seal(office, once, tomas, await keyOf(office, tomas), 'second-engineer');
});
afterAll(() => office.stamps.close());

const verify = (pdf: Uint8Array, options: Partial<VerifyOptions> = {}) =>
  verifyPdf(pdf, { trust: office.trust, ...options });
/** Codes of the reasons, then kinds of the changes. */
const found = async (pdf: Uint8Array, options: Partial<VerifyOptions> = {}) => {
  const report = await verify(pdf, options);
  expect(report.fault).toBeUndefined();
  expect(report.intact).toBe(report.reasons.length === 0);
  return [...report.reasons.map(({ code }) => code), ...report.changes.map(({ kind }) => kind)];
};

it('calls a sealed file intact, and says by whom, when and what is still open', async () => {
  const report = await verify(once);
  expect(report).toMatchObject({ intact: true, reasons: [], changes: [], openFields: ['second-engineer'] });
  expect(report.signers).toMatchObject([
    { field: 'engineer-of-record', holder: ines, coversWholeFile: true },
  ]);
  expect(Math.abs(Number(report.stamps[0]?.time) - Date.now())).toBeLessThan(60_000);
  expect(await found(twice)).toEqual([]);
});

it('calls a file without a signature not signed', async () => {
  expect(await found(base)).toEqual(['not-signed']);
});

describe('tells an update after signing from a signature:', () => {
  const changed = 'changed-after-signing';
  it('a page drawn over', async () => {
    expect(await found(await append(once, drawOver))).toEqual(
      expect.arrayContaining([changed, 'page-drawn-over']),
    );
    expect((await verify(await append(once, drawOver))).changes).toContainEqual(
      expect.objectContaining({ kind: 'page-drawn-over', page: 1 }),
    );
  });
  it('a note added', async () => {
    expect(await found(await append(once, addNote))).toEqual([changed, 'annotation']);
  });
  it('a page turned', async () => {
    const turned = await append(once, (document) => document.getPage(1).setRotation(degrees(90)));
    expect(await found(turned)).toEqual([changed, 'page-altered']);
  });
  it('a page added', async () => {
    const added = await append(once, (document) => void document.addPage());
    expect(await found(added)).toEqual(expect.arrayContaining([changed, 'pages-added']));
  });
  it('a page removed', async () => {
    const removed = await append(once, (document) => document.removePage(1));
    expect(await found(removed)).toEqual(expect.arrayContaining([changed, 'pages-removed']));
  });
  it('a script added', async () => {
    const scripted = await append(once, ({ catalog, context }) => {
      catalog.set(
        PDFName.of('OpenAction'),
        context.obj({ S: 'JavaScript', JS: PDFString.of('app.alert(1)') }),
      );
    });
    expect(await found(scripted)).toEqual([changed, 'catalog']);
  });
  it('another title', async () => {
    expect(await found(await append(once, (document) => document.setTitle('S-09')))).toEqual([
      changed,
      'information',
    ]);
  });
  it('saved again with nothing in it', async () => {
    expect(await found(appendObjects(once, {}))).toEqual([changed, 'empty-update']);
  });
  it('an object nothing leads to', async () => {
    expect(await found(appendObjects(once, { 899: '<< /Type /Annot >>' }))).toEqual([changed, 'object']);
  });
  it('validation data added, which is no change, unless an earlier reference led to where it stands', async () => {
    const leading = await append(base, ({ context, catalog }) => {
      catalog.set(PDFName.of('Names'), context.obj({ Later: PDFRef.of(890) }));
    });
    const sealed = await seal(office, leading, ines, key);
    expect(await found(sealed)).toEqual([]);
    const withStore = (at: number) =>
      append(sealed, ({ context, catalog }) => {
        context.assign(PDFRef.of(at), context.flateStream('a certificate'));
        catalog.set(PDFName.of('DSS'), context.obj({ Certs: [PDFRef.of(at)] }));
      });
    expect(await found(await withStore(899))).toEqual([]);
    expect(await found(await withStore(890))).toEqual([changed, 'object']);
  });
  it('a field added', async () => {
    const added = await append(once, ({ context, catalog }) => {
      const form = catalog.lookup(PDFName.of('AcroForm'), PDFDict);
      const field = context.obj({ FT: 'Sig', T: PDFString.of('third-engineer') });
      form.lookup(PDFName.of('Fields'), PDFArray).push(context.register(field));
      context.snapshot?.markRefForSave(catalog.get(PDFName.of('AcroForm')) as PDFRef);
    });
    expect(await found(added)).toEqual([changed, 'field']);
  });
  it('a font exchanged for another', async () => {
    const text = Buffer.from(once).toString('latin1');
    const font = text.match(/\n(\d+) 0 obj\s*<<[^>]*\/BaseFont \/Helvetica/)?.[1];
    const other = '<< /Type /Font /Subtype /Type1 /BaseFont /Courier >>';
    expect(await found(appendObjects(once, { [Number(font)]: other }))).toEqual([changed, 'object']);
  });
  it('a later signer who moves his field, or draws with more than lines', async () => {
    const key = await keyOf(office, tomas);
    const { trust, stamps } = office;
    // Words of the same length, put into the update before it is signed.
    const signedWith = async (from: string, to: string) => {
      const prepared = await prepare(once, tomas, 'second-engineer');
      const at = Buffer.from(prepared.bytes).indexOf(from, once.length, 'latin1');
      expect(at).toBeGreaterThan(0);
      prepared.bytes.set(Buffer.from(to, 'latin1'), at);
      const service = { url: stamps.url, anchors: trust.stampAnchors };
      return insertSignature(prepared, (await stampSignature(await sign(prepared, key), service)).cms);
    };
    expect(await found(await signedWith('/Rect [ 400', '/Rect [ 401'))).toEqual([changed, 'field']);
    expect(await found(await signedWith('/Matrix [', '/MatriX ['))).toEqual(
      expect.arrayContaining([changed, 'seal-appearance']),
    );
    expect(await found(await signedWith('/Resources <<\n>>', '/Resources 9 0 R'))).toEqual(
      expect.arrayContaining([changed, 'seal-appearance']),
    );
  });
  it('a field filled with an earlier signature', async () => {
    const text = Buffer.from(once).toString('latin1');
    const signature = text.match(/\/V (\d+) 0 R/)?.[1];
    const [, open, dict] =
      [...text.matchAll(/\n(\d+) 0 obj\s*(<<(?:(?!endobj).)*\/FT \/Sig(?:(?!endobj).)*)>>\s*endobj/gs)][1] ??
      [];
    const filled = appendObjects(once, { [Number(open)]: `${dict} /V ${signature} 0 R >>` });
    expect(await found(filled)).toEqual(expect.arrayContaining([changed, 'field']));
  });
  it('a second signer who draws over the first one’s page in his own update', async () => {
    const drawn = await append(once, drawOver);
    const prepared = await prepare(drawn, tomas, 'second-engineer');
    const service = { url: office.stamps.url, anchors: office.trust.stampAnchors };
    const stamped = await stampSignature(await sign(prepared, await keyOf(office, tomas)), service);
    const report = await verify(insertSignature(prepared, stamped.cms));
    expect(report.intact).toBe(false);
    expect(report.signers).toHaveLength(2);
    expect(report.changes).toContainEqual(expect.objectContaining({ kind: 'page-drawn-over', page: 1 }));
  });
  it('an earlier signature written over', async () => {
    const ref = Buffer.from(once)
      .toString('latin1')
      .match(/\/V (\d+) 0 R/)?.[1];
    const over = appendObjects(once, { [Number(ref)]: '<< /Type /Sig >>' });
    expect((await verify(over)).intact).toBe(false);
  });
});

describe('does not understand, and so does not accept,', () => {
  it('a truncated file', async () => {
    for (const part of [0.2, 0.5, 0.9, 0.999]) {
      expect(await found(once.subarray(0, Math.floor(once.length * part)))).toEqual(['not-understood']);
    }
  });
  it('no file, and another kind of file', async () => {
    expect(await found(new Uint8Array(0))).toEqual(['not-understood']);
    expect(await found(new TextEncoder().encode('PK\u0003\u0004'))).toEqual(['not-understood']);
  });
  it('bytes after the end', async () => {
    const longer = new Uint8Array([...once, 0x25, 0x41]);
    expect(await found(longer)).toEqual(['not-understood']);
    expect(await found(new Uint8Array([...once, 0x0a]))).toEqual(['byte-range']);
  });
  it('bytes hidden inside an update', async () => {
    expect(await found(appendObjects(once, { 899: '1' }, '% hidden\n'))).toEqual(['not-understood']);
  });
});

it('tells a changed byte of the drawing', async () => {
  const damaged = new Uint8Array(once);
  const at = Buffer.from(once).indexOf('stream\n') + 12;
  damaged[at] = (damaged[at] as number) ^ 1;
  expect(await found(damaged)).toContain('content-changed');
});

describe('compares with what was issued:', () => {
  it('a file cut back to its first signature', async () => {
    const back = twice.subarray(0, once.length);
    expect(await found(back)).toEqual([]);
    const expected = { fields: ['engineer-of-record', 'second-engineer'] };
    expect(await found(back, { expected })).toEqual(['signature-missing']);
    expect(await found(twice, { expected })).toEqual([]);
  });
  it('a file that is not byte for byte the stored one', async () => {
    const { sha256 } = await verify(twice);
    expect(await found(twice, { expected: { sha256 } })).toEqual([]);
    expect(await found(once, { expected: { sha256 } })).toEqual(['not-the-issued-file']);
  });
});

describe('the signature itself:', () => {
  const edited = (edit: (data: SignedData) => void) => withCms(once, editCms(lastCms(once), edit));

  it('a stamp removed', async () => {
    const bare = edited(({ signerInfos }) => {
      for (const one of signerInfos) one.unsignedAttrs = undefined;
    });
    expect(await found(bare)).toEqual(['time-stamp-missing']);
    expect(await found(bare, { expected: { stamped: false } })).toEqual([]);
  });
  it('a stamp taken from another signature', async () => {
    let other: SignedData['signerInfos'][0] | undefined;
    editCms(lastCms(twice), ({ signerInfos }) => {
      other = signerInfos[0];
    });
    const borrowed = edited(({ signerInfos: [own] }) => {
      if (own) own.unsignedAttrs = other?.unsignedAttrs;
    });
    expect(await found(borrowed)).toEqual(['time-stamp-wrong']);
  });
  it('content of its own in place of the file’s', async () => {
    const inside = edited((data) => {
      data.encapContentInfo = new EncapsulatedContentInfo({
        eContentType: data.encapContentInfo.eContentType,
        eContent: new asn1js.OctetString({ valueHex: new Uint8Array([1, 2, 3]) }),
      });
    });
    expect(await found(inside)).toEqual(['not-a-signature']);
  });
  it('a range that leaves out more than the signature', async () => {
    const prepared = await prepare(base, ines);
    const { from, to } = prepared.hole;
    const wider = { from: from - 1, to };
    const text = Buffer.from(prepared.bytes);
    const at = text.indexOf(`[ 0 ${from} ${to}`, base.length, 'latin1');
    prepared.bytes.set(Buffer.from(`[ 0 ${from - 1}`, 'latin1'), at);
    const cms = await sign({ ...prepared, hole: wider }, key);
    expect(await found(insertSignature(prepared, cms), { expected: { stamped: false } })).toEqual([
      'byte-range',
    ]);
  });
  it('an attribute that is signed twice', async () => {
    const doubled = edited(({ signerInfos: [own] }) => {
      const attributes = own?.signedAttrs?.attributes;
      if (attributes?.[0]) attributes.splice(1, 0, attributes[0]);
    });
    expect(await found(doubled)).toEqual(['bad-attributes']);
  });
  it('a second signer beside the first', async () => {
    const both = edited((data) => data.signerInfos.push(data.signerInfos[0] as SignedData['signerInfos'][0]));
    expect(await found(both)).toEqual(['not-a-signature']);
  });
  it('a signature taken from another file', async () => {
    const other = await seal(office, await makeBase(), ines, key);
    expect(await found(withCms(once, lastCms(other)))).toEqual(['content-changed']);
  });
  it('a length that takes in some of the padding', async () => {
    const cms = lastCms(once);
    const longer = new Uint8Array([...cms, 0, 0]);
    new DataView(longer.buffer).setUint16(2, cms.length - 4 + 2);
    expect(await found(withCms(once, longer))).toEqual(['not-a-signature']);
  });
  it('bytes hidden after it in its own hole', async () => {
    const hidden = new Uint8Array(once);
    const text = Buffer.from(once).toString('latin1');
    hidden[text.indexOf('>', text.lastIndexOf('/Contents <') + 11) - 1] = 0x31;
    expect(await found(hidden)).toEqual(['byte-range']);
  });
});

it('tells a certificate exchanged for another with the same key, name and number', async () => {
  const now = Date.now();
  const dates = { validFrom: new Date(now - 1e8), validTo: new Date(now + 1e9) };
  const root = await makeKey('P-256');
  const authority = await makeCertificate(
    { role: 'authority', name: 'Another register', publicKey: root.publicKey, ...dates },
    { key: root },
  );
  const own = await makeKey('P-256');
  const issued = await makeCertificate(
    { role: 'documents', ...ines, publicKey: own.publicKey, ...dates },
    { certificate: authority, key: root },
  );
  const twin = Certificate.fromBER(issued.toSchema().toBER());
  twin.notAfter.value = new Date(now + 2e9);
  await twin.sign(root.key, root.hash);
  const trust = { ...office.trust, anchors: [authority] };
  const prepared = await prepare(base, ines);
  const cms = await sign(prepared, makeSigner(own, issued));
  const options = { trust, expected: { stamped: false } };
  expect(await found(insertSignature(prepared, cms), options)).toEqual([]);
  const exchanged = editCms(cms, (data) => {
    data.certificates = [Certificate.fromBER(twin.toSchema(true).toBER())];
  });
  expect(await found(insertSignature(prepared, exchanged), options)).toEqual(['certificate-exchanged']);
});

describe('trust:', () => {
  const daysFromNow = (days: number) => new Date(Date.now() + days * 86_400_000);

  it('a signer from an authority nobody chose', async () => {
    const stranger = await openOffice();
    expect(await found(once, { trust: { ...office.trust, anchors: stranger.trust.anchors } })).toEqual([
      'certificate-unknown',
    ]);
    expect(
      await found(once, { trust: { ...office.trust, stampAnchors: stranger.trust.stampAnchors } }),
    ).toEqual(['certificate-unknown']);
    await stranger.stamps.close();
  });
  it('a certificate that expired after it was stamped has signed well; without a stamp it has not', async () => {
    const now = daysFromNow(2000);
    expect(await found(once, { now })).toEqual([]);
    const bare = withCms(
      once,
      editCms(lastCms(once), ({ signerInfos }) => {
        for (const one of signerInfos) one.unsignedAttrs = undefined;
      }),
    );
    expect(await found(bare, { now, expected: { stamped: false } })).toEqual(['certificate-expired']);
  });
  it('a certificate revoked before the stamp, and one revoked after', async () => {
    const list = async (at: Date) =>
      CertificateRevocationList.fromBER(
        await office.authority.listRevoked([{ certificate: key.certificate, at }], daysFromNow(1)),
      );
    const before = { trust: { ...office.trust, crls: [await list(daysFromNow(-1))] } };
    const after = { trust: { ...office.trust, crls: [await list(daysFromNow(1))] } };
    expect(await found(once, before)).toEqual(['certificate-revoked']);
    expect(await found(once, after)).toEqual([]);
  });
});
