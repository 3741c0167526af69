// server only
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { demoKeys } from '@/lib/signing/demo-keys';
import { startLocalTimeStampServer } from '@/lib/signing/local-time-stamp-server';
import { startLocalMailServer } from './local-mail-server';

/**
 * The demo's stand-ins for what is hosted outside: an SMTP server that keeps mail as files, and a time-stamping authority.
 * Prints the settings that point at them as one line of JSON, then stays until it is
 * stopped or its input closes, as it does when the one who started it is gone.
 */
async function main(folder: string): Promise<void> {
  mkdirSync(folder, { recursive: true });
  const mailPort = await startLocalMailServer(folder);
  const keys = await demoKeys(folder);
  const stamp = await startLocalTimeStampServer(keys.timeStamper);
  const settings = {
    SMTP_URL: `smtp://127.0.0.1:${mailPort}`,
    TIME_STAMP_URL: stamp.url,
    TRUST_PEM_FILE: join(folder, 'demo-authority.pem'),
    DEMO_FOLDER: folder,
  };
  process.stdout.write(`${JSON.stringify(settings)}\n`);
  process.stdin.resume().once('end', () => process.exit(0));
}

await main(process.argv[2] as string);
