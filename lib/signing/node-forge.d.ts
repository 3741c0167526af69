/** The part of node-forge 1.4.3 that opens old key files; the package ships no types of its own. */
declare module 'node-forge/lib/forge.js' {
  interface ForgeBuffer {
    getBytes(): string;
  }
  interface ForgeCipher {
    readonly output: ForgeBuffer;
    update(input: ForgeBuffer): void;
    finish(): boolean;
  }
  const forge: {
    asn1: { fromDer(bytes: string): object };
    util: { encodeUtf8(text: string): string; createBuffer(bytes: string): ForgeBuffer };
    pki: {
      oids: { pkcs5PBES2: string };
      pbe: { getCipher(algorithm: string, parameters: object, password: string): ForgeCipher };
    };
  };
  export default forge;
}
declare module 'node-forge/lib/pbe.js';
