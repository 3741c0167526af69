import * as asn1js from 'asn1js';
import {
  AlgorithmIdentifier,
  Attribute,
  type Certificate,
  ContentInfo,
  createCMSECDSASignature,
  EncapsulatedContentInfo,
  GeneralName,
  IssuerAndSerialNumber,
  SignedAndUnsignedAttributes,
  SignedData,
  SignerInfo,
} from 'pkijs';
import { type Bytes, compareBytes } from './bytes';
import { hashOid, oid, signatureOid } from './oid';
import type { Signer } from './signer';

function encoded(part: { toSchema(): asn1js.BaseBlock }): Bytes {
  return new Uint8Array(part.toSchema().toBER());
}

/** ESS signing-certificate-v2 (RFC 5035): binds the very certificate, so that no other with the same key can stand in. */
async function signingCertificate(certificate: Certificate): Promise<Attribute> {
  const hash = await crypto.subtle.digest('SHA-256', encoded(certificate));
  const issuer = new GeneralName({ type: 4, value: certificate.issuer }).toSchema();
  const issuerSerial = new asn1js.Sequence({
    value: [new asn1js.Sequence({ value: [issuer] }), certificate.serialNumber],
  });
  // The hash algorithm is left out: SHA-256 is its default, and DER writes no defaults.
  const id = new asn1js.Sequence({ value: [new asn1js.OctetString({ valueHex: hash }), issuerSerial] });
  const list = new asn1js.Sequence({ value: [id] });
  return new Attribute({ type: oid.signingCertificateV2, values: [new asn1js.Sequence({ value: [list] })] });
}

/** The attributes a PAdES baseline signature signs (ETSI EN 319 142-1, 6.3): no signing-time, the time stamp gives it. */
async function signedAttributes(digest: Bytes, certificate: Certificate, contentType: string) {
  const attributes = [
    new Attribute({
      type: oid.contentType,
      values: [new asn1js.ObjectIdentifier({ value: contentType })],
    }),
    new Attribute({ type: oid.messageDigest, values: [new asn1js.OctetString({ valueHex: digest })] }),
    await signingCertificate(certificate),
  ];
  // DER sorts a SET OF; pkijs writes the order it is given.
  attributes.sort((a, b) => compareBytes(encoded(a), encoded(b)));
  return new SignedAndUnsignedAttributes({ type: 0, attributes });
}

/** Content to carry inside (a time stamp does), or none: a detached signature over data kept elsewhere. */
export interface CmsContent {
  readonly type: string;
  readonly bytes?: Bytes;
}

/**
 * Builds CMS SignedData (RFC 5652) in DER over content whose hash by `signer.hash` is `digest`.
 * RSA PKCS #1 v1.5 or ECDSA; the signer's certificate and chain go along.
 */
export async function buildCms(
  digest: Bytes,
  signer: Signer,
  content: CmsContent = { type: oid.data },
): Promise<Bytes> {
  const { certificate, chain, family, hash } = signer;
  const signedAttrs = await signedAttributes(digest, certificate, content.type);
  const toBeSigned = encoded(signedAttrs);
  toBeSigned[0] = 0x31; // signed as a SET, stored under its tag [0] (RFC 5652, 5.4)
  const raw = await signer.sign(toBeSigned);
  const digestAlgorithm = new AlgorithmIdentifier({ algorithmId: hashOid[hash] });
  const signerInfo = new SignerInfo({
    version: 1,
    sid: new IssuerAndSerialNumber({ issuer: certificate.issuer, serialNumber: certificate.serialNumber }),
    digestAlgorithm,
    signedAttrs,
    signatureAlgorithm: new AlgorithmIdentifier({
      algorithmId: signatureOid[family][hash],
      ...(family === 'RSA' ? { algorithmParams: new asn1js.Null() } : {}),
    }),
    signature: new asn1js.OctetString({
      valueHex: family === 'EC' ? createCMSECDSASignature(raw.buffer) : raw,
    }),
  });
  const signedData = new SignedData({
    version: content.type === oid.data ? 1 : 3,
    digestAlgorithms: [digestAlgorithm],
    encapContentInfo: new EncapsulatedContentInfo({
      eContentType: content.type,
      ...(content.bytes ? { eContent: new asn1js.OctetString({ valueHex: content.bytes }) } : {}),
    }),
    certificates: [certificate, ...chain],
    signerInfos: [signerInfo],
  });
  return encoded(new ContentInfo({ contentType: oid.signedData, content: signedData.toSchema() }));
}
