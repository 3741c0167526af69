// server only
import { createHash } from 'node:crypto';
import { type Certificate, type CertificateRevocationList, TSTInfo } from 'pkijs';
import { type Bytes, compareBytes, toHex } from './bytes';
import { checkChain } from './check-chain';
import { checkSignerInfo } from './check-signer-info';
import { hashOid, oid } from './oid';
import { parseCms } from './parse-cms';
import { readCertificate } from './read-certificate';
import { SignatureRefusal } from './signature-refusal';

export interface TimeStamp {
  readonly time: Date;
  readonly authority: string;
  readonly serial: string;
  /** The number the request carried, in hexadecimal; a stamp asked for without one has none. */
  readonly nonce?: string;
}

function readInfo(inner: Bytes | undefined): TSTInfo {
  if (!inner) throw new SignatureRefusal('time-stamp-wrong', 'empty');
  try {
    return TSTInfo.fromBER(inner);
  } catch (cause) {
    throw new SignatureRefusal('time-stamp-wrong', 'not a time stamp', cause);
  }
}

/**
 * Checks a time-stamp token (RFC 3161) over `stamped`: imprint, signature, and its authority up to `anchors` at the
 * stamp's own time. Throws SignatureRefusal.
 */
export async function checkTimeStamp(
  token: Bytes,
  stamped: Uint8Array,
  anchors: readonly Certificate[],
  crls: readonly CertificateRevocationList[] = [],
): Promise<TimeStamp> {
  const cms = parseCms(token, oid.timeStampInfo);
  const info = readInfo(cms.inner);
  const { hashAlgorithm, hashedMessage } = info.messageImprint;
  const hash = Object.entries(hashOid).find(([, id]) => id === hashAlgorithm.algorithmId)?.[0];
  if (!hash) throw new SignatureRefusal('weak-algorithm', 'time stamp');
  const imprint = createHash(hash.replace('-', '')).update(stamped).digest();
  if (compareBytes(hashedMessage.valueBlock.valueHexView, imprint) !== 0) {
    throw new SignatureRefusal('time-stamp-wrong', 'stamps something else');
  }
  if (cms.signerInfo.unsignedAttrs)
    throw new SignatureRefusal('time-stamp-wrong', 'attributes nobody signed');
  const certificate = checkSignerInfo(cms, cms.inner as Bytes, oid.timeStampInfo);
  await checkChain(certificate, cms.certificates, info.genTime, { purpose: 'time-stamping', anchors, crls });
  return {
    time: info.genTime,
    authority: readCertificate(certificate).holder.name,
    serial: toHex(info.serialNumber.valueBlock.valueHexView),
    ...(info.nonce ? { nonce: toHex(info.nonce.valueBlock.valueHexView) } : {}),
  };
}
