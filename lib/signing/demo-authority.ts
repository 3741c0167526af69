// server only
import * as asn1js from 'asn1js';
import { type Certificate, CertificateRevocationList, RevokedCertificate, Time } from 'pkijs';
import type { Bytes } from './bytes';
import { type CertificateRequest, makeCertificate } from './make-certificate';
import { type KeyKind, type MadeKey, makeKey } from './make-key';
import { makeKeyFile } from './make-key-file';
import { makeSigner } from './make-signer';
import type { Signer } from './signer';

export const demoAuthorityName = 'Register of Engineers of Orrin, demo CA';

export interface DemoEngineer {
  readonly name: string;
  readonly licenceNumber: string;
  readonly organization?: string;
  readonly key?: KeyKind;
  readonly validFrom?: Date;
  readonly validTo?: Date;
}

export interface KeyFile {
  readonly file: Bytes;
  readonly certificate: Certificate;
}

/** An invented authority for demonstration and tests. It lives in memory: keep the files it issues, not itself. */
export interface DemoAuthority {
  readonly certificate: Certificate;
  /** A document-signing key file (PKCS #12) for an engineer. */
  issueKeyFile(engineer: DemoEngineer, password: string): Promise<KeyFile>;
  /** A key file whose certificate is for time stamps alone. */
  issueTimeStampKeyFile(password: string): Promise<KeyFile>;
  /** The same, ready to use. */
  issueTimeStamper(): Promise<Signer>;
  /** A signed list of revoked certificates, in DER, good for a week. */
  listRevoked(revoked: readonly { certificate: Certificate; at: Date }[], now?: Date): Promise<Bytes>;
}

const day = 86_400_000;

/** Makes the authority: its key P-256, its certificate self-signed for ten years from the day before `now`. */
export async function makeDemoAuthority(now = new Date()): Promise<DemoAuthority> {
  const key = await makeKey('P-256');
  const dates = { validFrom: new Date(+now - day), validTo: new Date(+now + 3650 * day) };
  const organization = 'Register of Engineers of Orrin (invented)';
  const certificate = await makeCertificate(
    { role: 'authority', name: demoAuthorityName, organization, publicKey: key.publicKey, ...dates },
    { key },
  );
  const issue = async (kind: KeyKind, request: Omit<CertificateRequest, 'publicKey'>) => {
    const made = await makeKey(kind);
    return {
      made,
      issued: await makeCertificate({ ...request, publicKey: made.publicKey }, { certificate, key }),
    };
  };
  const issueTimeStampKey = () =>
    issue('P-256', { role: 'time-stamping', name: 'Orrin demo time stamps', organization, ...dates });
  const toFile = async ({ made, issued }: { made: MadeKey; issued: Certificate }, password: string) => ({
    file: await makeKeyFile(made.key, [issued, certificate], password),
    certificate: issued,
  });
  return {
    certificate,
    async issueKeyFile({ key: kind = 'RSA-3072', validFrom, validTo, ...who }, password) {
      const valid = {
        validFrom: validFrom ?? dates.validFrom,
        validTo: validTo ?? new Date(+now + 1095 * day),
      };
      return toFile(await issue(kind, { role: 'documents', ...who, ...valid }), password);
    },
    issueTimeStampKeyFile: async (password) => toFile(await issueTimeStampKey(), password),
    async issueTimeStamper() {
      const { made, issued } = await issueTimeStampKey();
      return makeSigner(made, issued);
    },
    async listRevoked(revoked, at = new Date()) {
      const list = new CertificateRevocationList({ version: 1 });
      list.issuer = certificate.subject;
      list.thisUpdate = new Time({ type: 0, value: at });
      list.nextUpdate = new Time({ type: 0, value: new Date(+at + 7 * day) });
      if (revoked.length > 0) {
        list.revokedCertificates = revoked.map(
          (one) =>
            new RevokedCertificate({
              userCertificate: new asn1js.Integer({
                valueHex: one.certificate.serialNumber.valueBlock.valueHexView,
              }),
              revocationDate: new Time({ type: 0, value: one.at }),
            }),
        );
      }
      await list.sign(key.key, key.hash);
      return new Uint8Array(list.toSchema(true).toBER());
    },
  };
}
