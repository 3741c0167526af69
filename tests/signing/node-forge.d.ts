/** The part of node-forge 1.4.3 that these tests write a key file with. */
declare module 'node-forge' {
  interface Pair {
    readonly publicKey: object;
    readonly privateKey: object;
  }
  interface Named {
    readonly name: string;
    readonly value: string;
  }
  interface Certificate {
    publicKey: object;
    serialNumber: string;
    readonly validity: { notBefore: Date; notAfter: Date };
    setSubject(names: Named[]): void;
    setIssuer(names: Named[]): void;
    sign(key: object, hash: object): void;
  }
  const forge: {
    pki: { rsa: { generateKeyPair(bits: number): Pair }; createCertificate(): Certificate };
    md: { sha256: { create(): object } };
    pkcs12: {
      toPkcs12Asn1(
        key: object,
        certificates: Certificate[],
        password: string,
        how: { algorithm: string },
      ): object;
    };
    asn1: { toDer(value: object): { getBytes(): string } };
  };
  export default forge;
}
