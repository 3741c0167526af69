import type { Certificate, Extension, ExtKeyUsage, RelativeDistinguishedNames } from 'pkijs';
import { oid } from './oid';
import type { CertificateFacts, CertificateUse } from './signer';

const uses = new Map<string, CertificateUse>([
  [oid.documentSigning, 'document-signing'],
  ['1.3.6.1.4.1.311.10.3.12', 'document-signing'],
  ['1.2.840.113583.1.1.5', 'document-signing'],
  [oid.emailProtection, 'email-protection'],
  [oid.anyPurpose, 'any'],
]);

export function nameAttribute(name: RelativeDistinguishedNames, type: string): string | undefined {
  return name.typesAndValues.find((part) => part.type === type)?.value.valueBlock.value;
}

export function extension(certificate: Certificate, type: string): Extension | undefined {
  return certificate.extensions?.find((one) => one.extnID === type);
}

export function keyPurposes(certificate: Certificate): readonly string[] | undefined {
  const found = extension(certificate, oid.extendedKeyUsage)?.parsedValue as ExtKeyUsage | undefined;
  return found?.keyPurposes;
}

export function isAuthority(certificate: Certificate): boolean {
  const found = extension(certificate, oid.basicConstraints)?.parsedValue as { cA?: boolean } | undefined;
  return found?.cA === true;
}

/** Whether the key usage lets the key sign data: digitalSignature or nonRepudiation, or no restriction (RFC 5280, 4.2.1.3). */
export function maySignData(certificate: Certificate): boolean {
  const found = extension(certificate, oid.keyUsage)?.parsedValue as
    | { valueBlock: { valueHexView: Uint8Array } }
    | undefined;
  return found === undefined || ((found.valueBlock.valueHexView[0] ?? 0) & 0xc0) !== 0;
}

export function certificateUses(certificate: Certificate): CertificateUse[] {
  const purposes = keyPurposes(certificate);
  if (!purposes) return ['any'];
  return [...new Set(purposes.flatMap((purpose) => uses.get(purpose) ?? []))];
}

/** Whether the certificate may seal a document: an end entity whose usages allow it. */
export function maySeal(certificate: Certificate): boolean {
  return maySignData(certificate) && !isAuthority(certificate) && certificateUses(certificate).length > 0;
}

/** Whether the certificate may stamp times: for that purpose alone, marked critical (RFC 3161, 2.3). */
export function mayStampTime(certificate: Certificate): boolean {
  const purposes = keyPurposes(certificate);
  const alone = purposes?.length === 1 && purposes[0] === oid.timeStamping;
  const critical = extension(certificate, oid.extendedKeyUsage)?.critical === true;
  return alone && critical && maySignData(certificate) && !isAuthority(certificate);
}

export function readCertificate(certificate: Certificate): CertificateFacts {
  return {
    holder: {
      name: nameAttribute(certificate.subject, oid.commonName) ?? '',
      licenceNumber: nameAttribute(certificate.subject, oid.serialNumber),
      organization: nameAttribute(certificate.subject, oid.organization),
    },
    issuer: nameAttribute(certificate.issuer, oid.commonName) ?? '',
    validFrom: certificate.notBefore.value,
    validTo: certificate.notAfter.value,
    usage: certificateUses(certificate),
  };
}
