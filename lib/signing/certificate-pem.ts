import { Certificate } from 'pkijs';

/** Reads every certificate of a PEM text, as a file of trust anchors holds them. Throws on a damaged one. */
export function readPem(pem: string): Certificate[] {
  return [...pem.matchAll(/-----BEGIN CERTIFICATE-----([^-]*)-----END CERTIFICATE-----/g)].map(([, body]) =>
    Certificate.fromBER(Uint8Array.from(atob((body ?? '').replace(/\s/g, '')), (c) => c.charCodeAt(0))),
  );
}

export function writePem(certificates: readonly Certificate[]): string {
  return certificates
    .map((certificate) => {
      const binary = String.fromCharCode(...new Uint8Array(certificate.toSchema().toBER()));
      const lines = btoa(binary).replace(/.{64}/g, '$&\n');
      return `-----BEGIN CERTIFICATE-----\n${lines}\n-----END CERTIFICATE-----\n`;
    })
    .join('');
}
