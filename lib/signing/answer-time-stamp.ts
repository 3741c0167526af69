// server only
import { createHash, randomBytes } from 'node:crypto';
import * as asn1js from 'asn1js';
import { Accuracy, ContentInfo, PKIStatusInfo, TimeStampReq, TimeStampResp, TSTInfo } from 'pkijs';
import { buildCms } from './build-cms';
import type { Bytes } from './bytes';
import { encoded } from './check-signer-info';
import { hashOid, oid } from './oid';
import type { Signer } from './signer';

/** A policy number under the arc for examples (RFC 5612's enterprise number 32473): it promises nothing. */
const demoPolicy = '1.3.6.1.4.1.32473.1.1';

function rejection(): Bytes {
  return encoded(new TimeStampResp({ status: new PKIStatusInfo({ status: 2 }) }));
}

/** Answers an RFC 3161 request with a token signed by `signer`, or with a rejection. */
export async function answerTimeStamp(request: Bytes, signer: Signer, time: Date): Promise<Bytes> {
  let asked: TimeStampReq;
  try {
    asked = TimeStampReq.fromBER(request);
  } catch {
    return rejection(); // RFC 3161, 2.4.2: a request that cannot be read is answered, not dropped
  }
  const { messageImprint, nonce } = asked;
  if (!Object.values(hashOid).includes(messageImprint.hashAlgorithm.algorithmId)) return rejection();
  const serial = new Uint8Array(randomBytes(9));
  serial[0] = 1;
  const info = new TSTInfo({
    version: 1,
    policy: demoPolicy,
    messageImprint,
    serialNumber: new asn1js.Integer({ valueHex: serial }),
    genTime: time,
    accuracy: new Accuracy({ seconds: 1 }),
    ...(nonce ? { nonce } : {}),
  });
  const bytes = encoded(info);
  const digest = new Uint8Array(createHash(signer.hash.replace('-', '')).update(bytes).digest());
  const token = await buildCms(digest, signer, { type: oid.timeStampInfo, bytes });
  return encoded(
    new TimeStampResp({
      status: new PKIStatusInfo({ status: 0 }),
      timeStampToken: ContentInfo.fromBER(token),
    }),
  );
}
