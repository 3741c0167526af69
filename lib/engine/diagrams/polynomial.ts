/** Polynomials in one variable as coefficient lists, lowest power first. */
export type Coefficients = readonly number[];

/** Horner's rule. */
export function evaluate(c: Coefficients, x: number): number {
  let value = 0;
  for (let i = c.length - 1; i >= 0; i--) value = value * x + (c[i] as number);
  return value;
}

export function derive(c: Coefficients): number[] {
  return c.slice(1).map((k, i) => k * (i + 1));
}

/** The antiderivative whose value at 0 is `start`. */
export function integrate(c: Coefficients, start: number): number[] {
  return [start, ...c.map((k, i) => k / (i + 1))];
}

export function multiply(a: Coefficients, b: Coefficients): number[] {
  const product = new Array<number>(Math.max(0, a.length + b.length - 1)).fill(0);
  for (let i = 0; i < a.length; i++) {
    for (let k = 0; k < b.length; k++) {
      product[i + k] = (product[i + k] as number) + (a[i] as number) * (b[k] as number);
    }
  }
  return product;
}

/** a + factor · b; a power that one of them lacks counts as zero. */
export function add(a: Coefficients, b: Coefficients, factor = 1): number[] {
  const total = [...a];
  while (total.length < b.length) total.push(0);
  b.forEach((k, i) => {
    total[i] = (total[i] as number) + factor * k;
  });
  return total;
}

/** The same function in the variable x − by: Taylor's expansion about `by`. */
export function shift(c: Coefficients, by: number): number[] {
  const result = [...c];
  for (let i = 0; i < result.length; i++) {
    for (let k = result.length - 2; k >= i; k--) {
      result[k] = (result[k] as number) + by * (result[k + 1] as number);
    }
  }
  return result;
}
