// server only
import { createHmac, timingSafeEqual } from 'node:crypto';

const stepSeconds = 30;

/** A one-time code of `digits` figures for a counter (HOTP with HMAC-SHA-1, RFC 4226, section 5.3). */
export function codeForCounter(secret: Uint8Array, counter: number, digits = 6): string {
  const message = Buffer.alloc(8);
  message.writeBigUInt64BE(BigInt(counter));
  const mac = createHmac('sha1', secret).update(message).digest();
  const offset = mac.readUInt8(mac.length - 1) & 15;
  const number = mac.readUInt32BE(offset) & 0x7fffffff;
  return String(number % 10 ** digits).padStart(digits, '0');
}

/** The time step of an instant: periods of thirty seconds since 1970 (RFC 6238, section 4). */
export function timeStep(at: Date): number {
  return Math.floor(at.getTime() / 1000 / stepSeconds);
}

/**
 * The time step that a code of six figures belongs to: the step now or one beside it, for clocks that differ (RFC 6238,
 * section 5.2), and later than `after`, so that no code is taken twice. Undefined when it is none of them.
 */
export function stepOfCode(secret: Uint8Array, code: string, at: Date, after: number): number | undefined {
  const now = timeStep(at);
  return [now - 1, now, now + 1].find(
    (step) => step > after && timingSafeEqual(Buffer.from(codeForCounter(secret, step)), Buffer.from(code)),
  );
}
