import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Document, Page, renderToBuffer, Text } from '@react-pdf/renderer';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { writePem } from '@/lib/signing/certificate-pem';
import { placeSignatureFields } from '@/lib/signing/place-signature-fields';
import { signedPart } from '@/lib/signing/signed-part';
import { fetchTimeStamp } from '@/lib/signing/time-stamp';
import { verifyPdf } from '@/lib/signing/verify-pdf';
import { ines, keyOf, makeBase, type Office, openOffice, places, prepare, seal, sign, tomas } from './office';

/** Poppler's pdfsig and OpenSSL read what is written here: two readers that share no code with it. */
let office: Office;
let folder: string;
const file = (name: string, bytes: Uint8Array | string) => {
  const path = join(folder, name);
  writeFileSync(path, bytes);
  return path;
};
const run = (command: string, ...args: string[]) =>
  execFileSync(command, args, { encoding: 'utf8', stdio: 'pipe' });

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'signing-'));
  office = await openOffice();
});
afterAll(async () => {
  await office.stamps.close();
  rmSync(folder, { recursive: true });
});

async function makeRendered(): Promise<Uint8Array> {
  const pages = ['S-01 Roof purlin', 'S-02 Quay beam'].map((words) => (
    <Page key={words} size="LETTER">
      <Text>{words}</Text>
    </Page>
  ));
  return placeSignatureFields(await renderToBuffer(<Document>{pages}</Document>), places);
}

describe.each([
  ['pdf-lib', makeBase],
  ['@react-pdf/renderer', makeRendered],
])('a file made by %s and sealed by two engineers', (_, make) => {
  it('is valid to pdfsig and intact to the verifier', async () => {
    const keys = {
      ines: await keyOf(office, { ...ines, key: 'RSA-2048' }),
      tomas: await keyOf(office, { ...tomas, key: 'P-384' }),
    };
    const once = await seal(office, await make(), ines, keys.ines);
    const twice = await seal(office, once, tomas, keys.tomas, 'second-engineer');
    // pdfsig exits with 0 whatever it finds: its words count.
    const first = run('pdfsig', file('once.pdf', once));
    expect(first).toContain('Signature Validation: Signature is Valid.');
    expect(first).toContain('Total document signed');
    const both = run('pdfsig', file('twice.pdf', twice));
    expect(both.match(/Signature is Valid\./g)).toHaveLength(2);
    expect(both.match(/\n {2}- Total document signed/g)).toHaveLength(1);
    expect(both).toContain('Signature Type: ETSI.CAdES.detached');
    const report = await verifyPdf(twice, {
      trust: office.trust,
      expected: { fields: places.map((p) => p.field) },
    });
    expect(report).toMatchObject({ intact: true, reasons: [], changes: [], openFields: [] });
    expect(report.signers.map(({ holder, coversWholeFile }) => [holder.name, coversWholeFile])).toEqual([
      [ines.name, false],
      [tomas.name, true],
    ]);
    expect(report.stamps).toHaveLength(2);
    run('qpdf', '--check', file('checked.pdf', twice));
  });
});

describe('OpenSSL', () => {
  it.each(['RSA-2048', 'P-256', 'P-384'] as const)(
    'verifies a signature by %s up to the authority',
    async (key) => {
      const prepared = await prepare(await makeBase(), ines);
      const cms = await sign(prepared, await keyOf(office, { ...ines, key }));
      const out = join(folder, 'out');
      run(
        'openssl',
        ...['cms', '-verify', '-binary', '-inform', 'DER', '-in', file('cms', cms), '-out', out],
        ...['-content', file('content', signedPart(prepared.bytes, prepared.hole))],
        ...['-CAfile', file('ca.pem', writePem([office.authority.certificate])), '-purpose', 'any'],
      );
    },
  );

  it('verifies the time stamp of the demonstration service', async () => {
    const data = new TextEncoder().encode('S-01');
    const service = { url: office.stamps.url, anchors: office.trust.stampAnchors };
    const { token } = await fetchTimeStamp(service, data);
    const said = run(
      'openssl',
      ...['ts', '-verify', '-in', file('token', token), '-token_in', '-data', file('data', data)],
      ...['-CAfile', file('ca.pem', writePem([office.authority.certificate]))],
    );
    expect(said).toContain('Verification: OK');
  });
});
