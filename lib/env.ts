// server only
import { z } from 'zod';

const schema = z.object({
  DATABASE_URL: z.string().default('mysql://root@127.0.0.1:3307/fairhand'),
  APP_URL: z.url().default('http://127.0.0.1:3000'),
  SMTP_URL: z.string().default('smtp://127.0.0.1:2525'),
  MAIL_FROM: z.string().default('Fairhand <calculations@localhost>'),
  TIME_STAMP_URL: z.string().optional(),
  /** PEM of the authorities whose certificates may seal and stamp. */
  TRUST_PEM_FILE: z.string().optional(),
  /** Folder of the demo: its mail can be read in the browser. Absent: no demo. */
  DEMO_FOLDER: z.string().optional(),
  LOG_LEVEL: z.enum(['trace', 'debug', 'info', 'warn', 'error', 'silent']).default('info'),
  NODE_ENV: z.string().default('development'),
});

export interface Env {
  databaseUrl: string;
  appUrl: string;
  smtpUrl: string;
  mailFrom: string;
  timeStampUrl: string | undefined;
  trustPemFile: string | undefined;
  demoFolder: string | undefined;
  demo: boolean;
  logLevel: string;
  production: boolean;
}

let read: Env | undefined;

/** The settings of this process, read once; a setting that makes no sense is named in the error. */
export function env(): Env {
  if (read) return read;
  const parsed = schema.safeParse(process.env);
  if (!parsed.success) {
    const said = parsed.error.issues.map((i) => `${i.path.join('.')}: ${i.message}`).join('; ');
    throw new Error(`Settings in the environment cannot be used. ${said}`);
  }
  const e = parsed.data;
  read = {
    databaseUrl: e.DATABASE_URL,
    appUrl: e.APP_URL.replace(/\/$/, ''),
    smtpUrl: e.SMTP_URL,
    mailFrom: e.MAIL_FROM,
    timeStampUrl: e.TIME_STAMP_URL,
    trustPemFile: e.TRUST_PEM_FILE,
    demoFolder: e.DEMO_FOLDER,
    demo: e.DEMO_FOLDER !== undefined,
    logLevel: e.LOG_LEVEL,
    production: e.NODE_ENV === 'production',
  };
  return read;
}
