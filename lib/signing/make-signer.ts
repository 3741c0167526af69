import type { Certificate } from 'pkijs';
import type { SigningKey } from './import-key';
import { readCertificate } from './read-certificate';
import type { Signer } from './signer';

/** Issuers of `own` among `others`, nearest first; self-signed roots are left out: a reader trusts its own. */
function chainOf(own: Certificate, others: readonly Certificate[]): Certificate[] {
  const chain: Certificate[] = [];
  for (let last = own; ; ) {
    const issuer = others.find((one) => one.subject.isEqual(last.issuer) && !one.subject.isEqual(one.issuer));
    if (!issuer || chain.includes(issuer)) return chain;
    chain.push(issuer);
    last = issuer;
  }
}

export function makeSigner(
  signing: SigningKey,
  own: Certificate,
  others: readonly Certificate[] = [],
): Signer {
  return {
    ...readCertificate(own),
    certificate: own,
    chain: chainOf(own, others),
    family: signing.family,
    hash: signing.hash,
    sign: async (bytes) => new Uint8Array(await crypto.subtle.sign(signing.signAs, signing.key, bytes)),
  };
}
