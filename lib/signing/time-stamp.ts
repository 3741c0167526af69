// server only
import { createHash, randomBytes } from 'node:crypto';
import * as asn1js from 'asn1js';
import {
  AlgorithmIdentifier,
  Attribute,
  type Certificate,
  ContentInfo,
  MessageImprint,
  SignedAndUnsignedAttributes,
  SignedData,
  TimeStampReq,
  TimeStampResp,
} from 'pkijs';
import { type Bytes, toHex } from './bytes';
import { signatureValue } from './check-signature';
import { encoded } from './check-signer-info';
import { checkTimeStamp, type TimeStamp } from './check-time-stamp';
import { hashOid, oid } from './oid';
import { parseCms } from './parse-cms';
import { SignatureRefusal } from './signature-refusal';

export interface TimeStampService {
  readonly url: string;
  readonly anchors: readonly Certificate[];
  /** Milliseconds to wait for an answer. */
  readonly timeout?: number;
}

const mostBytes = 20_000;
/** How far the service's clock may stand from the server's. */
const mostDrift = 5 * 60_000;

async function post(service: TimeStampService, body: Bytes): Promise<Bytes> {
  try {
    const response = await fetch(service.url, {
      method: 'POST',
      headers: { 'content-type': 'application/timestamp-query' },
      body,
      redirect: 'error',
      signal: AbortSignal.timeout(service.timeout ?? 15_000),
    });
    if (!response.ok) throw new Error(`HTTP ${response.status}`);
    return new Uint8Array(await response.arrayBuffer());
  } catch (cause) {
    throw new SignatureRefusal('time-stamp-unavailable', service.url, cause);
  }
}

function readReply(reply: Bytes): Bytes {
  let parsed: TimeStampResp;
  try {
    parsed = TimeStampResp.fromBER(reply);
  } catch (cause) {
    throw new SignatureRefusal('time-stamp-unavailable', 'the answer is not a time stamp', cause);
  }
  if (parsed.status.status > 1 || !parsed.timeStampToken) {
    throw new SignatureRefusal('time-stamp-refused', `status ${parsed.status.status}`);
  }
  return encoded(parsed.timeStampToken);
}

/** Asks an RFC 3161 service to stamp `data`, and checks the answer, its nonce and its clock. Throws SignatureRefusal. */
export async function fetchTimeStamp(
  service: TimeStampService,
  data: Uint8Array,
  now = () => new Date(),
): Promise<{ token: Bytes; stamp: TimeStamp }> {
  const nonce = new Uint8Array(randomBytes(9));
  nonce[0] = 1; // positive, and without a leading zero that DER would drop
  const request = new TimeStampReq({
    version: 1,
    messageImprint: new MessageImprint({
      hashAlgorithm: new AlgorithmIdentifier({
        algorithmId: hashOid['SHA-256'],
        algorithmParams: new asn1js.Null(),
      }),
      hashedMessage: new asn1js.OctetString({
        valueHex: new Uint8Array(createHash('sha256').update(data).digest()),
      }),
    }),
    nonce: new asn1js.Integer({ valueHex: nonce }),
    certReq: true,
  });
  const token = readReply(await post(service, encoded(request)));
  if (token.length > mostBytes) throw new SignatureRefusal('time-stamp-wrong', `${token.length} bytes`);
  const stamp = await checkTimeStamp(token, data, service.anchors);
  if (stamp.nonce !== toHex(nonce)) throw new SignatureRefusal('time-stamp-wrong', 'nonce');
  if (Math.abs(+stamp.time - +now()) > mostDrift) throw new SignatureRefusal('time-stamp-wrong', 'clock');
  return { token, stamp };
}

function withToken(cms: Bytes, token: Bytes): Bytes {
  const data = new SignedData({ schema: ContentInfo.fromBER(cms).content });
  const [signerInfo] = data.signerInfos;
  if (!signerInfo) throw new SignatureRefusal('not-a-signature', 'no signer');
  const values = [asn1js.fromBER(token).result];
  const attributes = [new Attribute({ type: oid.timeStampToken, values })];
  signerInfo.unsignedAttrs = new SignedAndUnsignedAttributes({ type: 1, attributes });
  return encoded(new ContentInfo({ contentType: oid.signedData, content: data.toSchema() }));
}

/** Has a signature stamped and puts the token beside it: PAdES level B-T (ETSI EN 319 142-1). Throws SignatureRefusal. */
export async function stampSignature(
  cms: Bytes,
  service: TimeStampService,
  now = () => new Date(),
): Promise<{ cms: Bytes; stamp: TimeStamp }> {
  const { token, stamp } = await fetchTimeStamp(service, signatureValue(parseCms(cms, oid.data)), now);
  return { cms: withToken(cms, token), stamp };
}
