import { describe, expect, it } from 'vitest';
import { fromBase32, toBase32 } from '@/lib/services/second-factor/base32';
import { codeForCounter, stepOfCode, timeStep } from '@/lib/services/second-factor/one-time-code';
import { newRecoveryCodes, recoveryHash } from '@/lib/services/second-factor/recovery-code';

const secret = new TextEncoder().encode('12345678901234567890');

describe('a one-time code', () => {
  // RFC 4226, appendix D: the first ten codes of six figures for the secret above (table recalled, not fetched).
  const hotp = '755224 287082 359152 969429 338314 254676 287922 162583 399871 520489'.split(' ');
  it.each(hotp.map((code, counter) => [counter, code] as const))('for counter %i is %s', (counter, code) => {
    expect(codeForCounter(secret, counter)).toBe(code);
  });

  // RFC 6238, appendix B, the rows for SHA-1, eight figures (table recalled, not fetched).
  it.each([
    [59, '94287082'],
    [1111111109, '07081804'],
    [1111111111, '14050471'],
    [1234567890, '89005924'],
    [2000000000, '69279037'],
    [20000000000, '65353130'],
  ])('at second %i is %s', (second, code) => {
    expect(codeForCounter(secret, timeStep(new Date(second * 1000)), 8)).toBe(code);
  });

  it('is taken one step early or late, and not two', () => {
    const at = new Date(1234567890 * 1000);
    const taken = [-2, -1, 0, 1, 2].map((shift) => {
      const code = codeForCounter(secret, timeStep(at) + shift);
      return stepOfCode(secret, code, at, 0) === timeStep(at) + shift;
    });
    expect(taken).toEqual([false, true, true, true, false]);
  });

  it('is not taken twice', () => {
    const at = new Date(1234567890 * 1000);
    const code = codeForCounter(secret, timeStep(at));
    expect(stepOfCode(secret, code, at, timeStep(at))).toBeUndefined();
  });
});

describe('base32', () => {
  // RFC 4648, section 10, without the padding.
  it.each([
    ['', ''],
    ['f', 'MY'],
    ['fo', 'MZXQ'],
    ['foo', 'MZXW6'],
    ['foob', 'MZXW6YQ'],
    ['fooba', 'MZXW6YTB'],
    ['foobar', 'MZXW6YTBOI'],
  ])('of “%s” is %s, and back', (text, base32) => {
    expect(toBase32(new TextEncoder().encode(text))).toBe(base32);
    expect(new TextDecoder().decode(fromBase32(base32))).toBe(text);
  });

  it('refuses other signs', () => {
    expect(() => fromBase32('MZ1')).toThrow(RangeError);
  });
});

describe('recovery codes', () => {
  it('are ten, all different, and known however they are typed', () => {
    const codes = newRecoveryCodes();
    expect(new Set(codes).size).toBe(10);
    for (const code of codes) expect(code).toMatch(/^([a-z2-7]{4}-){3}[a-z2-7]{4}$/);
    const [code] = codes as [string];
    expect(recoveryHash(` ${code.toUpperCase().replaceAll('-', ' ')}`)).toBe(recoveryHash(code));
  });
});
