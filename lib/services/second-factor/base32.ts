const letters = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567';

/** Bytes as base32 without padding (RFC 4648, section 6). */
export function toBase32(bytes: Uint8Array): string {
  let text = '';
  let bits = 0;
  let held = 0;
  for (const byte of bytes) {
    held = (held << 8) | byte;
    bits += 8;
    while (bits >= 5) {
      bits -= 5;
      text += letters[(held >>> bits) & 31];
      held &= (1 << bits) - 1;
    }
  }
  return bits === 0 ? text : text + letters[(held << (5 - bits)) & 31];
}

/** Bytes of base32 text; spaces and padding are passed over. Throws a RangeError on any other sign. */
export function fromBase32(text: string): Uint8Array {
  const bytes: number[] = [];
  let bits = 0;
  let held = 0;
  for (const letter of text.replace(/[\s=]/g, '').toUpperCase()) {
    const value = letters.indexOf(letter);
    if (value < 0) throw new RangeError(`“${letter}” is no sign of base32`);
    held = (held << 5) | value;
    bits += 5;
    if (bits < 8) continue;
    bits -= 8;
    bytes.push((held >>> bits) & 255);
    held &= (1 << bits) - 1;
  }
  return Uint8Array.from(bytes);
}
