/** Object identifiers of the certificates and signatures this folder reads and writes (RFC 5280, 5652, 5035, 3161, 9336). */
export const oid = {
  data: '1.2.840.113549.1.7.1',
  signedData: '1.2.840.113549.1.7.2',
  contentType: '1.2.840.113549.1.9.3',
  messageDigest: '1.2.840.113549.1.9.4',
  signingCertificate: '1.2.840.113549.1.9.16.2.12',
  signingCertificateV2: '1.2.840.113549.1.9.16.2.47',
  timeStampToken: '1.2.840.113549.1.9.16.2.14',
  timeStampInfo: '1.2.840.113549.1.9.16.1.4',
  friendlyName: '1.2.840.113549.1.9.20',
  localKeyId: '1.2.840.113549.1.9.21',
  rsaEncryption: '1.2.840.113549.1.1.1',
  ecPublicKey: '1.2.840.10045.2.1',
  p256: '1.2.840.10045.3.1.7',
  p384: '1.3.132.0.34',
  pbes2: '1.2.840.113549.1.5.13',
  pbmac1: '1.2.840.113549.1.5.14',
  aesPrefix: '2.16.840.1.101.3.4.1.',
  keyBag: '1.2.840.113549.1.12.10.1.1',
  shroudedKeyBag: '1.2.840.113549.1.12.10.1.2',
  certificateBag: '1.2.840.113549.1.12.10.1.3',
  commonName: '2.5.4.3',
  serialNumber: '2.5.4.5',
  organization: '2.5.4.10',
  keyUsage: '2.5.29.15',
  basicConstraints: '2.5.29.19',
  extendedKeyUsage: '2.5.29.37',
  anyPurpose: '2.5.29.37.0',
  timeStamping: '1.3.6.1.5.5.7.3.8',
  emailProtection: '1.3.6.1.5.5.7.3.4',
  documentSigning: '1.3.6.1.5.5.7.3.36',
} as const;

export type HashName = 'SHA-256' | 'SHA-384' | 'SHA-512';

/** Hashes a signature may use. Anything else is refused as weak or unknown. */
export const hashOid: Record<HashName, string> = {
  'SHA-256': '2.16.840.1.101.3.4.2.1',
  'SHA-384': '2.16.840.1.101.3.4.2.2',
  'SHA-512': '2.16.840.1.101.3.4.2.3',
};

export const signatureOid: Record<'RSA' | 'EC', Record<HashName, string>> = {
  RSA: {
    'SHA-256': '1.2.840.113549.1.1.11',
    'SHA-384': '1.2.840.113549.1.1.12',
    'SHA-512': '1.2.840.113549.1.1.13',
  },
  EC: {
    'SHA-256': '1.2.840.10045.4.3.2',
    'SHA-384': '1.2.840.10045.4.3.3',
    'SHA-512': '1.2.840.10045.4.3.4',
  },
};
