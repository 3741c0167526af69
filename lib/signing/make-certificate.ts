// server only
import * as asn1js from 'asn1js';
import {
  AttributeTypeAndValue,
  AuthorityKeyIdentifier,
  BasicConstraints,
  Certificate,
  Extension,
  ExtKeyUsage,
  RelativeDistinguishedNames,
  Time,
} from 'pkijs';
import type { Bytes } from './bytes';
import type { SigningKey } from './import-key';
import { oid } from './oid';

/** What a certificate is made for. */
export type CertificateRole = 'authority' | 'documents' | 'time-stamping';

export interface CertificateRequest {
  readonly role: CertificateRole;
  /** Common name. */
  readonly name: string;
  readonly organization?: string;
  /** Stands in the subject's serialNumber. */
  readonly licenceNumber?: string;
  readonly publicKey: CryptoKey;
  readonly validFrom: Date;
  readonly validTo: Date;
}

/** Who signs it; absent for a self-signed authority. */
export interface Issuer {
  readonly certificate?: Certificate;
  readonly key: SigningKey;
}

const purposes = {
  // Mail protection beside document signing: some readers do not know the newer purpose (RFC 9336).
  documents: [oid.emailProtection, oid.documentSigning],
  'time-stamping': [oid.timeStamping],
} as const;

/** First byte and number of unused bits of KeyUsage: keyCertSign and cRLSign; digitalSignature and nonRepudiation. */
const usages = {
  authority: [0x06, 1],
  documents: [0xc0, 6],
  'time-stamping': [0x80, 7],
} as const;

/** A name of one attribute a step (RFC 4514); pkijs alone would put them all into one. */
function distinguishedName(
  parts: readonly (readonly [string, string | undefined])[],
): RelativeDistinguishedNames {
  const steps = parts.flatMap(([type, text]) => {
    if (text === undefined) return [];
    const value = new asn1js.Utf8String({ value: text });
    return [new asn1js.Set({ value: [new AttributeTypeAndValue({ type, value }).toSchema()] })];
  });
  return RelativeDistinguishedNames.fromBER(new asn1js.Sequence({ value: steps }).toBER());
}

function put(into: Certificate, extnID: string, critical: boolean, value: asn1js.BaseBlock): void {
  into.extensions?.push(new Extension({ extnID, critical, extnValue: value.toBER() }));
}

/** SHA-1 of the public key's bits, as RFC 5280, 4.2.1.2 suggests for the key identifier. */
async function keyIdentifier(certificate: Certificate): Promise<asn1js.OctetString> {
  const bits = new Uint8Array(certificate.subjectPublicKeyInfo.subjectPublicKey.valueBlock.valueHexView);
  return new asn1js.OctetString({ valueHex: await crypto.subtle.digest('SHA-1', bits) });
}

/** A positive random number of 16 bytes. */
function serialNumber(): Bytes {
  const serial = crypto.getRandomValues(new Uint8Array(16));
  serial[0] = ((serial[0] as number) & 0x3f) | 0x40;
  return serial;
}

/** Makes an X.509 v3 certificate (RFC 5280). For a demonstration and tests: nobody vouches for its names. */
export async function makeCertificate(request: CertificateRequest, issuer: Issuer): Promise<Certificate> {
  const certificate = new Certificate({ version: 2, extensions: [] });
  certificate.serialNumber = new asn1js.Integer({ valueHex: serialNumber() });
  certificate.subject = distinguishedName([
    [oid.organization, request.organization],
    [oid.commonName, request.name],
    [oid.serialNumber, request.licenceNumber],
  ]);
  certificate.issuer = issuer.certificate?.subject ?? certificate.subject;
  // RFC 5280, 4.1.2.5: UTCTime through 2049, GeneralizedTime from 2050.
  const time = (value: Date) => new Time({ type: value.getUTCFullYear() < 2050 ? 0 : 1, value });
  certificate.notBefore = time(request.validFrom);
  certificate.notAfter = time(request.validTo);
  await certificate.subjectPublicKeyInfo.importKey(request.publicKey);
  const authority = request.role === 'authority';
  const constraints = new BasicConstraints(authority ? { cA: true, pathLenConstraint: 0 } : {});
  put(certificate, oid.basicConstraints, true, constraints.toSchema());
  const [usage, unusedBits] = usages[request.role];
  const bits = new asn1js.BitString({ valueHex: new Uint8Array([usage]), unusedBits });
  put(certificate, oid.keyUsage, true, bits);
  if (request.role !== 'authority') {
    const keyPurposes = [...purposes[request.role]];
    const critical = request.role === 'time-stamping'; // RFC 3161, 2.3
    put(certificate, oid.extendedKeyUsage, critical, new ExtKeyUsage({ keyPurposes }).toSchema());
  }
  put(certificate, '2.5.29.14', false, await keyIdentifier(certificate));
  const authorityKey = new AuthorityKeyIdentifier({
    keyIdentifier: new asn1js.OctetString({
      valueHex: (await keyIdentifier(issuer.certificate ?? certificate)).valueBlock.valueHexView,
    }),
  });
  put(certificate, '2.5.29.35', false, authorityKey.toSchema());
  await certificate.sign(issuer.key.key, issuer.key.hash);
  return Certificate.fromBER(certificate.toSchema(true).toBER());
}
