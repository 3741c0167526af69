const sentences = {
  'wrong-password': 'The password does not open this file, or the file is damaged.',
  'not-a-key-file': 'This is not a key file. Choose a file ending in .p12 or .pfx.',
  'no-key': 'The file holds no private key with its certificate.',
  'unsupported-encryption':
    'The file is encrypted in a way that cannot be opened here. Export it again with AES-256.',
  'unsupported-key':
    'The key is of a kind that cannot seal here. RSA of 2048 bits or more, P-256 and P-384 can.',
  expired: 'The certificate has expired. Ask its authority for a new one.',
  'not-yet-valid': 'The certificate is not yet valid.',
  'wrong-purpose': 'The certificate is not issued for signing documents.',
} as const;

export type KeyFileCode = keyof typeof sentences;

/** Why a key file does not open: a code for programs, a sentence for its owner. */
export class KeyFileError extends Error {
  override readonly name = 'KeyFileError';
  constructor(
    readonly code: KeyFileCode,
    cause?: unknown,
  ) {
    super(sentences[code], { cause });
  }
}
