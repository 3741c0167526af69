/** TeX of a fraction or whole number: `\tfrac{2}{3}`, `3`. */
export function fractionTex(n: number, d: number): string {
  if (d === 1) return `${n}`;
  return `${n < 0 ? '-' : ''}\\tfrac{${Math.abs(n)}}{${d}}`;
}

/** A small number as a power of ten with one figure, `9\times10^{-14}`; from a thousandth up as it is; zero is `0`. */
export function powerTex(value: number): string {
  if (value === 0) return '0';
  if (Math.abs(value) >= 1e-3) return `${Number(value.toPrecision(2))}`;
  const [digits = '1', exponent = '0'] = Math.abs(value).toExponential(0).split('e');
  const power = `10^{${Number(exponent)}}`;
  return `${value < 0 ? '-' : ''}${digits === '1' ? power : `${digits}\\times${power}`}`;
}
