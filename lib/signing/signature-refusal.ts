const sentences = {
  'not-a-signature': 'What stands in place of a signature cannot be read as one.',
  'weak-algorithm':
    'The signature uses a method that is not accepted: RSA of 2048 bits, P-256 or SHA-256 at least.',
  'bad-attributes': 'The signature does not state what it signs in the way it must.',
  'content-changed': 'The document is not the one that was signed: its bytes have changed.',
  'signature-wrong': 'The signature was not made with the key of its certificate.',
  'certificate-missing': 'The certificate of the signer is not in the signature.',
  'certificate-exchanged': 'The certificate is not the one the signer signed with.',
  'certificate-expired': 'The certificate had expired at the time of signing.',
  'certificate-not-yet-valid': 'The certificate was not yet valid at the time of signing.',
  'certificate-purpose': 'The certificate is not issued for this purpose.',
  'certificate-unknown': 'The certificate does not come from an authority that is trusted here.',
  'certificate-revoked': 'The certificate had been revoked at the time of signing.',
  'revocation-unknown': 'No current list says whether the certificate is revoked.',
  'another-person': 'The certificate names another person or another licence number.',
  'time-stamp-unavailable': 'The time-stamping service does not answer. Nothing was sealed; try again later.',
  'time-stamp-refused': 'The time-stamping service refused to stamp the signature.',
  'time-stamp-wrong':
    'The time stamp does not belong to this signature, or is not from a service trusted here.',
  'time-stamp-missing': 'The signature carries no time stamp.',
  'signature-too-long': 'The signature with its certificates is longer than the room kept for it.',
  'byte-range': 'The signature does not cover the whole file as it stood when it was signed.',
} as const;

export type SignatureCode = keyof typeof sentences;

/** Why a signature is not accepted: a code for programs, a sentence for people, the particulars for the log. */
export class SignatureRefusal extends Error {
  override readonly name = 'SignatureRefusal';
  constructor(
    readonly code: SignatureCode,
    readonly detail?: string,
    cause?: unknown,
  ) {
    super(sentences[code], { cause });
  }
}
