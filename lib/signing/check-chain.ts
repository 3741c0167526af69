// server only
import { X509Certificate } from 'node:crypto';
import { type Certificate, CertificateChainValidationEngine, type CertificateRevocationList } from 'pkijs';
import { compareBytes } from './bytes';
import { encoded } from './check-signer-info';
import { oid, signatureOid } from './oid';
import { extension, maySeal, mayStampTime } from './read-certificate';
import { type SignatureCode, SignatureRefusal } from './signature-refusal';

export type Purpose = 'sealing' | 'time-stamping';

export interface ChainCheck {
  readonly purpose: Purpose;
  /** Roots the office chose. What a file brings along is never trusted. */
  readonly anchors: readonly Certificate[];
  readonly crls?: readonly CertificateRevocationList[];
  /** The list of revoked certificates must be in force at `at`: asked of a new signature, not of an old one. */
  readonly currentList?: boolean;
}

const accepted = new Set([...Object.values(signatureOid.RSA), ...Object.values(signatureOid.EC)]);
const curves = new Set(['prime256v1', 'secp384r1', 'secp521r1']);
/** Key usage, names, constraints and policies: extensions this check or pkijs handles. */
const understood = new Set(
  ['15', '17', '19', '30', '32', '33', '36', '37', '54'].map((last) => `2.5.29.${last}`),
);

function refuse(code: SignatureCode, detail: string): never {
  throw new SignatureRefusal(code, detail);
}

function checkPurpose(certificate: Certificate, purpose: Purpose): void {
  const suits = purpose === 'sealing' ? maySeal : mayStampTime;
  if (!suits(certificate)) refuse('certificate-purpose', `not for ${purpose}`);
  const strange = certificate.extensions?.find((one) => one.critical && !understood.has(one.extnID));
  if (strange) refuse('certificate-purpose', `critical extension ${strange.extnID}`);
}

function checkStrength(path: readonly Certificate[]): void {
  for (const [i, certificate] of path.entries()) {
    const last = i === path.length - 1;
    if (!last && !accepted.has(certificate.signatureAlgorithm.algorithmId)) {
      refuse('weak-algorithm', `certificate signed with ${certificate.signatureAlgorithm.algorithmId}`);
    }
    const { asymmetricKeyType, asymmetricKeyDetails } = new X509Certificate(encoded(certificate)).publicKey;
    const strong =
      asymmetricKeyType === 'rsa'
        ? (asymmetricKeyDetails?.modulusLength ?? 0) >= 2048
        : asymmetricKeyType === 'ec' && curves.has(asymmetricKeyDetails?.namedCurve ?? '');
    if (!strong) refuse('weak-algorithm', `key ${asymmetricKeyType}`);
  }
}

/** pkijs leaves the path length out. It counts the authorities between, not the end entity (RFC 5280, 4.2.1.9). */
function checkPathLength(path: readonly Certificate[]): void {
  for (const [i, certificate] of path.entries()) {
    if (i === 0) continue;
    const { pathLenConstraint } = (extension(certificate, oid.basicConstraints)?.parsedValue ?? {}) as {
      pathLenConstraint?: unknown;
    };
    if (typeof pathLenConstraint === 'number' && i - 1 > pathLenConstraint) {
      refuse('certificate-unknown', 'path length');
    }
  }
}

/** pkijs compares no revocation date; a certificate revoked after it signed has signed well. */
async function checkRevocation(path: readonly Certificate[], at: Date, check: ChainCheck): Promise<void> {
  for (const [i, certificate] of path.slice(0, -1).entries()) {
    const issuerCertificate = path[i + 1] as Certificate;
    let current = false;
    for (const list of check.crls ?? []) {
      if (!list.issuer.isEqual(certificate.issuer)) continue;
      if (!(await list.verify({ issuerCertificate }))) continue;
      const { nextUpdate } = list;
      current ||= list.thisUpdate.value <= at && nextUpdate !== undefined && at <= nextUpdate.value;
      const found = list.revokedCertificates?.find((one) =>
        one.userCertificate.isEqual(certificate.serialNumber),
      );
      if (found && found.revocationDate.value <= at) {
        refuse('certificate-revoked', found.revocationDate.value.toISOString());
      }
    }
    if (check.currentList && check.crls?.length && !current) refuse('revocation-unknown', `step ${i}`);
  }
}

/**
 * Checks a certificate at a moment, up to the office's own anchors: dates, purpose, path, strength, revocation.
 * `brought` are the certificates that came along; each must have a place on the path. Throws SignatureRefusal.
 */
export async function checkChain(
  certificate: Certificate,
  brought: readonly Certificate[],
  at: Date,
  check: ChainCheck,
): Promise<void> {
  if (at < certificate.notBefore.value)
    refuse('certificate-not-yet-valid', certificate.notBefore.value.toISOString());
  if (at > certificate.notAfter.value)
    refuse('certificate-expired', certificate.notAfter.value.toISOString());
  checkPurpose(certificate, check.purpose);
  const between = brought.filter((one) => one !== certificate && !one.issuer.isEqual(one.subject));
  const engine = new CertificateChainValidationEngine({
    trustedCerts: [...check.anchors],
    certs: [...between, certificate],
    checkDate: at,
  });
  const { result, resultMessage, certificatePath: path } = await engine.verify();
  const [first] = path ?? [];
  if (!result || !path || !first || compareBytes(encoded(first), encoded(certificate)) !== 0) {
    refuse('certificate-unknown', resultMessage);
  }
  const used = new Set(
    [...path, ...check.anchors].map((one) => Buffer.from(encoded(one)).toString('latin1')),
  );
  if (!brought.every((one) => used.has(Buffer.from(encoded(one)).toString('latin1')))) {
    refuse('certificate-unknown', 'a certificate that leads nowhere');
  }
  checkPathLength(path);
  checkStrength(path);
  await checkRevocation(path, at, check);
}
