import { describe, expect, it } from 'vitest';
import { readSettings } from '@/lib/env';

describe('settings of the environment', () => {
  it('have defaults that suit one machine', () => {
    const settings = readSettings({});
    expect(settings.appUrl).toBe('http://127.0.0.1:3000');
    expect(settings.demo).toBe(false);
    expect(settings.timeStampUrl).toBeUndefined();
  });

  it.each([
    ['DATABASE_URL', 'postgres://x/y', 'is to be mysql://'],
    ['DATABASE_URL', 'fairhand', 'is to be mysql://'],
    ['APP_URL', 'example.com', 'http or https'],
    ['SMTP_URL', 'mail.example:25', 'smtp://'],
    ['TIME_STAMP_URL', 'ftp://stamps.example', 'RFC 3161'],
    ['TRUST_PEM_FILE', '/nowhere/trust.pem', 'not there'],
    ['OFFICE_ZONE', 'Middle/Earth', 'time zone'],
    ['ADMINISTRATOR_EMAIL', 'nobody', 'e-mail address'],
    ['LOG_LEVEL', 'loud', 'trace, debug'],
  ])('say what is wrong with %s=%s', (name, value, said) => {
    expect(() => readSettings({ [name]: value })).toThrow(new RegExp(`${name} .*${said}`));
  });

  it('count as not set when they are empty', () => {
    expect(readSettings({ TIME_STAMP_URL: '', SMTP_URL: '' }).timeStampUrl).toBeUndefined();
  });
});
