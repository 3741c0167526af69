// server only
import * as asn1js from 'asn1js';
import type { Certificate, CertificateRevocationList } from 'pkijs';
import type { Bytes } from './bytes';
import { checkChain } from './check-chain';
import { checkSignerInfo } from './check-signer-info';
import { checkTimeStamp, type TimeStamp } from './check-time-stamp';
import { oid } from './oid';
import { type ParsedCms, parseCms } from './parse-cms';
import { readCertificate } from './read-certificate';
import { SignatureRefusal } from './signature-refusal';
import type { CertificateFacts } from './signer';

/** Whom the office trusts to name engineers, whom to tell the time, and what it knows of revoked certificates. */
export interface Trust {
  readonly anchors: readonly Certificate[];
  readonly stampAnchors: readonly Certificate[];
  readonly crls?: readonly CertificateRevocationList[];
}

export interface CheckedSignature extends CertificateFacts {
  /** Present: the moment the certificate was judged at. */
  readonly stamp?: TimeStamp;
}

function stampToken(cms: ParsedCms): Bytes | undefined {
  const attributes = cms.signerInfo.unsignedAttrs?.attributes ?? [];
  const [first, ...more] = attributes;
  if (!first) return undefined;
  const [token, ...others] = first.values;
  const sole = first.type === oid.timeStampToken && more.length === 0 && others.length === 0;
  if (!sole || !(token instanceof asn1js.Sequence))
    throw new SignatureRefusal('time-stamp-wrong', 'not one stamp');
  return new Uint8Array(token.toBER());
}

async function check(
  bytes: Bytes,
  content: Uint8Array,
  trust: Trust,
  now: Date,
  currentList: boolean,
): Promise<CheckedSignature> {
  const cms = parseCms(bytes, oid.data);
  if (cms.inner) throw new SignatureRefusal('not-a-signature', 'brings its own content');
  const certificate = checkSignerInfo(cms, content, oid.data);
  const token = stampToken(cms);
  const { anchors, stampAnchors, crls } = trust;
  const stamp = token && (await checkTimeStamp(token, signatureValue(cms), stampAnchors, crls));
  const chain = { purpose: 'sealing', anchors, crls, currentList } as const;
  await checkChain(certificate, cms.certificates, stamp?.time ?? now, chain);
  return { ...readCertificate(certificate), ...(stamp ? { stamp } : {}) };
}

/**
 * Checks a detached signature over `content`: the signer, the time stamp it may carry, and the signer's certificate at
 * the stamp's time, or at `now` when there is none. `currentList` asks that given lists of revoked certificates be in force.
 * Throws SignatureRefusal.
 */
export async function checkSignature(
  bytes: Bytes,
  content: Uint8Array,
  trust: Trust,
  now: Date,
  currentList = false,
): Promise<CheckedSignature> {
  try {
    return await check(bytes, content, trust, now, currentList);
  } catch (cause) {
    // Damaged structures make the ASN.1 library throw errors of its own.
    throw cause instanceof SignatureRefusal
      ? cause
      : new SignatureRefusal('not-a-signature', 'damaged', cause);
  }
}

/** The bytes a time stamp of a signature is made over. */
export function signatureValue(cms: ParsedCms): Bytes {
  return new Uint8Array(cms.signerInfo.signature.valueBlock.valueHexView);
}
