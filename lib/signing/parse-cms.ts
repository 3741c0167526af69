// server only
import * as asn1js from 'asn1js';
import { Certificate, ContentInfo, IssuerAndSerialNumber, SignedData, type SignerInfo } from 'pkijs';
import { type Bytes, compareBytes } from './bytes';
import { oid } from './oid';
import { SignatureRefusal } from './signature-refusal';

export interface ParsedCms {
  readonly signerInfo: SignerInfo;
  readonly certificates: readonly Certificate[];
  /** Content carried inside, where there is any. */
  readonly inner?: Bytes;
}

function refuse(detail: string, cause?: unknown): never {
  throw new SignatureRefusal('not-a-signature', detail, cause);
}

function decode(bytes: Bytes): SignedData {
  const { offset, result } = asn1js.fromBER(bytes);
  if (offset !== bytes.length || result.error) refuse('not one ASN.1 structure');
  const { contentType, content } = new ContentInfo({ schema: result });
  if (contentType !== oid.signedData) refuse(`content type ${contentType}`);
  const data = new SignedData({ schema: content });
  // Written out again it must be the same: nothing unread inside, and the one encoding DER allows.
  const again = new ContentInfo({ contentType, content: data.toSchema() }).toSchema().toBER();
  if (compareBytes(new Uint8Array(again), bytes) !== 0) refuse('not in the one encoding DER allows');
  return data;
}

/**
 * Reads CMS SignedData (RFC 5652) that holds exactly one signer and nothing unexpected, and says nothing of its truth.
 * `contentType` is what it must claim to sign. Throws SignatureRefusal.
 */
export function parseCms(bytes: Bytes, contentType: string): ParsedCms {
  let data: SignedData;
  try {
    data = decode(bytes);
  } catch (cause) {
    if (cause instanceof SignatureRefusal) throw cause;
    refuse('not SignedData', cause);
  }
  const { eContentType, eContent } = data.encapContentInfo;
  if (eContentType !== contentType) refuse(`signs ${eContentType}`);
  if (data.version !== (contentType === oid.data ? 1 : 3)) refuse(`version ${data.version}`);
  const [signerInfo, ...more] = data.signerInfos;
  if (!signerInfo || more.length > 0) refuse('not one signer');
  if (signerInfo.version !== 1 || !(signerInfo.sid instanceof IssuerAndSerialNumber))
    refuse('signer identifier');
  const digest = signerInfo.digestAlgorithm.algorithmId;
  if (data.digestAlgorithms.length !== 1 || data.digestAlgorithms[0]?.algorithmId !== digest) {
    refuse('digest algorithms');
  }
  if (data.crls?.length || data.ocsps?.length) refuse('revocation data inside');
  const certificates = data.certificates ?? [];
  if (!certificates.every((one) => one instanceof Certificate)) refuse('a certificate of another kind');
  return {
    signerInfo,
    certificates: certificates as Certificate[],
    ...(eContent ? { inner: new Uint8Array(eContent.getValue()) } : {}),
  };
}
