// server only
import { createTransport } from 'nodemailer';
import { env } from '../env';

export interface Letter {
  /** Stands in the Message-ID, so that a letter sent twice is known to be one. */
  id: string;
  to: string;
  subject: string;
  text: string;
  attachment?: { filename: string; content: Buffer } | undefined;
}

/** Hands a letter to the mail server; answers the server's words. All waiting together stays below four minutes. */
export async function sendMail(letter: Letter): Promise<string> {
  const transport = createTransport(env().smtpUrl, {
    connectionTimeout: 30_000,
    greetingTimeout: 30_000,
    socketTimeout: 60_000,
  } as object);
  try {
    const sent = await transport.sendMail({
      messageId: `<${letter.id}@${new URL(env().appUrl).hostname}>`,
      from: env().mailFrom,
      to: letter.to,
      subject: letter.subject,
      text: letter.text,
      attachments: letter.attachment ? [{ ...letter.attachment, contentType: 'application/pdf' }] : [],
    });
    return sent.response;
  } finally {
    transport.close();
  }
}

/** Whether the server refused for good (a reply of 500 to 599, RFC 5321 4.2.1), so that trying again is of no use. */
export function isRefusedForGood(error: unknown): boolean {
  if (!(error instanceof Error) || !('responseCode' in error)) return false;
  return typeof error.responseCode === 'number' && error.responseCode >= 500;
}
