import type { Certificate } from 'pkijs';
import type { Bytes } from './bytes';
import type { HashName } from './oid';

/** What a certificate's subject says of its holder. The licence number stands in the attribute serialNumber. */
export interface Holder {
  readonly name: string;
  readonly licenceNumber?: string;
  readonly organization?: string;
}

/** What an extended key usage allows; `any` also when the certificate does not restrict it. */
export type CertificateUse = 'document-signing' | 'email-protection' | 'any';

export interface CertificateFacts {
  readonly holder: Holder;
  /** Common name of the authority. */
  readonly issuer: string;
  readonly validFrom: Date;
  readonly validTo: Date;
  readonly usage: readonly CertificateUse[];
}

/**
 * The one door to a private key. A key file is behind it today; a token or a signing service would fit the same door.
 * `sign` takes the bytes themselves, hashes them with `hash`, and returns RSA PKCS #1 v1.5 or, for EC, raw r‖s.
 */
export interface Signer extends CertificateFacts {
  readonly certificate: Certificate;
  /** Issuers found beside the certificate, nearest first, without self-signed ones. */
  readonly chain: readonly Certificate[];
  readonly family: 'RSA' | 'EC';
  readonly hash: HashName;
  sign(bytes: Bytes): Promise<Bytes>;
}
