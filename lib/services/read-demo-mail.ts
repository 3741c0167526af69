// server only
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { simpleParser } from 'mailparser';
import { env } from '@/lib/env';
import { NotFound } from './service-error';

/** Mail that the demo sent, newest first. There is none outside of the demo. */
export async function readDemoMail(): Promise<
  { id: string; to: string; subject: string; at: Date; text: string }[]
> {
  const folder = env().demoFolder;
  if (folder === undefined) throw new NotFound('demo mail');
  const names = readdirSync(join(folder, 'mail'))
    .filter((n) => n.endsWith('.eml'))
    .sort()
    .reverse();
  return Promise.all(
    names.slice(0, 100).map(async (id) => {
      const mail = await simpleParser(readFileSync(join(folder, 'mail', id)));
      const to = [mail.to].flat().flatMap((t) => (t ? [t.text] : []));
      return {
        id,
        to: to.join(', '),
        subject: mail.subject ?? '',
        at: mail.date ?? new Date(0),
        text: mail.text ?? '',
      };
    }),
  );
}
