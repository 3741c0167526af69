// server only
import { createHash, createVerify } from 'node:crypto';
import * as asn1js from 'asn1js';
import {
  AlgorithmIdentifier,
  type Certificate,
  GeneralName,
  IssuerAndSerialNumber,
  type SignerInfo,
} from 'pkijs';
import { type Bytes, compareBytes } from './bytes';
import { hashOid, oid, signatureOid } from './oid';
import type { ParsedCms } from './parse-cms';
import { type SignatureCode, SignatureRefusal } from './signature-refusal';

const hashes = new Map(
  Object.entries(hashOid).map(([name, id]) => [id, name.replace('-', '').toLowerCase()]),
);

function refuse(code: SignatureCode, detail: string, cause?: unknown): never {
  throw new SignatureRefusal(code, detail, cause);
}

function plain(algorithm: AlgorithmIdentifier): string {
  const parameters = algorithm.algorithmParams;
  if (parameters !== undefined && !(parameters instanceof asn1js.Null))
    refuse('weak-algorithm', 'parameters');
  return algorithm.algorithmId;
}

/** The hash both algorithms name, as node:crypto calls it. A bare rsaEncryption takes the digest's. */
function hashOf(signerInfo: SignerInfo): string {
  const digest = plain(signerInfo.digestAlgorithm);
  const signature = plain(signerInfo.signatureAlgorithm);
  const name = Object.entries(hashOid).find(([, id]) => id === digest)?.[0] as
    | keyof typeof hashOid
    | undefined;
  if (!name) refuse('weak-algorithm', `digest ${digest}`);
  const allowed = [oid.rsaEncryption, signatureOid.RSA[name], signatureOid.EC[name]];
  if (!allowed.includes(signature)) refuse('weak-algorithm', `signature ${signature}`);
  return hashes.get(digest) as string;
}

function attributesOf(signerInfo: SignerInfo): Map<string, asn1js.BaseBlock> {
  const attributes = new Map<string, asn1js.BaseBlock>();
  for (const { type, values } of signerInfo.signedAttrs?.attributes ?? []) {
    if (attributes.has(type) || values.length !== 1) refuse('bad-attributes', `${type} more than once`);
    attributes.set(type, values[0]);
  }
  return attributes;
}

function parts(node: unknown): asn1js.BaseBlock[] {
  if (!(node instanceof asn1js.Sequence)) refuse('bad-attributes', 'signing certificate');
  return node.valueBlock.value;
}

/** ESS signing-certificate, first version (RFC 2634) with SHA-1 or second (RFC 5035): must mean this very certificate. */
function checkSigningCertificate(attributes: Map<string, asn1js.BaseBlock>, certificate: Certificate): void {
  const second = attributes.get(oid.signingCertificateV2);
  const attribute = second ?? attributes.get(oid.signingCertificate);
  if (!attribute) refuse('bad-attributes', 'no signing certificate');
  const id = [...parts(parts(parts(attribute)[0])[0])];
  let hash: string | undefined = second ? 'sha256' : 'sha1';
  if (id[0] instanceof asn1js.Sequence) {
    hash = second && hashes.get(plain(new AlgorithmIdentifier({ schema: id.shift() })));
    if (!hash) refuse('weak-algorithm', 'signing certificate');
  }
  const digest = createHash(hash).update(encoded(certificate)).digest();
  const stated = id[0];
  if (!(stated instanceof asn1js.OctetString)) refuse('bad-attributes', 'signing certificate');
  if (compareBytes(stated.valueBlock.valueHexView, digest) !== 0) refuse('certificate-exchanged', 'digest');
  if (id.length === 1) return;
  const [names, serial] = parts(id[1]);
  const name = new GeneralName({ schema: parts(names)[0] });
  if (!(serial instanceof asn1js.Integer) || !serial.isEqual(certificate.serialNumber)) {
    refuse('certificate-exchanged', 'serial number');
  }
  if (name.type !== 4 || !certificate.issuer.isEqual(name.value)) refuse('certificate-exchanged', 'issuer');
}

export function encoded(part: { toSchema(): asn1js.BaseBlock }): Bytes {
  return new Uint8Array(part.toSchema().toBER());
}

function verify(signerInfo: SignerInfo, certificate: Certificate, hash: string): boolean {
  const { signedAttrs, signature } = signerInfo;
  if (!signedAttrs) return false;
  const key = `-----BEGIN PUBLIC KEY-----\n${Buffer.from(encoded(certificate.subjectPublicKeyInfo)).toString('base64')}\n-----END PUBLIC KEY-----`;
  const family = certificate.subjectPublicKeyInfo.algorithm.algorithmId === oid.ecPublicKey ? 'EC' : 'RSA';
  const stated = signerInfo.signatureAlgorithm.algorithmId;
  const rsa = stated === oid.rsaEncryption || Object.values(signatureOid.RSA).includes(stated);
  if (rsa !== (family === 'RSA')) return false;
  const signed = new Uint8Array(signedAttrs.encodedValue);
  return createVerify(hash).update(signed).verify(key, signature.valueBlock.valueHexView);
}

/**
 * Checks one signer over `content`: algorithms, each attribute once, digest, the certificate the signer bound, signature.
 * Not yet whether that certificate is to be trusted. Returns the certificate. Throws SignatureRefusal.
 */
export function checkSignerInfo(cms: ParsedCms, content: Uint8Array, contentType: string): Certificate {
  const { signerInfo, certificates } = cms;
  const hash = hashOf(signerInfo);
  // Byte for byte: pkijs compares names without regard to case, and nobody signs this one.
  const sid = encoded(signerInfo.sid);
  const own = certificates.filter(
    ({ issuer, serialNumber }) =>
      compareBytes(sid, encoded(new IssuerAndSerialNumber({ issuer, serialNumber }))) === 0,
  );
  const certificate = own[0];
  if (!certificate || own.length > 1) refuse('certificate-missing', `${own.length} fit`);
  const attributes = attributesOf(signerInfo);
  const type = attributes.get(oid.contentType);
  if (!(type instanceof asn1js.ObjectIdentifier) || type.valueBlock.toString() !== contentType) {
    refuse('bad-attributes', 'content type');
  }
  const stated = attributes.get(oid.messageDigest);
  if (!(stated instanceof asn1js.OctetString)) refuse('bad-attributes', 'no digest');
  const digest = createHash(hash).update(content).digest();
  if (compareBytes(stated.valueBlock.valueHexView, digest) !== 0) refuse('content-changed', 'digest');
  checkSigningCertificate(attributes, certificate);
  let right: boolean;
  try {
    right = verify(signerInfo, certificate, hash);
  } catch (cause) {
    refuse('signature-wrong', 'key', cause);
  }
  if (!right) refuse('signature-wrong', 'signature');
  return certificate;
}
