/** Beyond this a product with a power of ten may stand for more than one decimal number. */
const safe = 2 ** 50;

/**
 * A value as its print with so many decimals reads; a half goes away from zero, and −0 is 0. Where the scaled value is
 * clear of a half, two whole numbers divided give the same double as reading the print; else the print decides.
 */
export function roundTo(value: number, decimals: number): number {
  const power = 10 ** decimals;
  const scaled = Math.abs(value) * power;
  const whole = Math.round(scaled);
  const clear =
    scaled < safe && Math.abs(Math.abs(scaled - Math.floor(scaled)) - 0.5) > 1e-15 * scaled + 1e-9;
  const rounded = clear ? whole / power : Number(Math.abs(value).toFixed(decimals));
  return rounded === 0 ? 0 : Math.sign(value) * rounded;
}
