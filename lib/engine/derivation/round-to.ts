/** A value as its print with so many decimals reads; a half goes away from zero, and −0 is 0. */
export function roundTo(value: number, decimals: number): number {
  const rounded = Number(Math.abs(value).toFixed(decimals));
  return rounded === 0 ? 0 : Math.sign(value) * rounded;
}
