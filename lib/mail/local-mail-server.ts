// server only
import { mkdirSync, writeFileSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { SMTPServer } from 'smtp-server';

/** An SMTP server on loopback that keeps every message as a file in folder/mail. Answers its port. */
export function startLocalMailServer(folder: string): Promise<number> {
  const mail = join(folder, 'mail');
  mkdirSync(mail, { recursive: true });
  let count = 0;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData(stream, _session, callback) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.on('end', () => {
        const name = `${new Date().toISOString().replace(/[:.]/g, '-')}-${String(count++).padStart(4, '0')}.eml`;
        writeFileSync(join(mail, name), Buffer.concat(parts));
        callback();
      });
    },
  });
  return new Promise((resolve, reject) => {
    server.on('error', reject);
    server.listen(0, '127.0.0.1', () => resolve((server.server.address() as AddressInfo).port));
  });
}
