const figures = new Intl.NumberFormat('en-US', { minimumFractionDigits: 3, maximumFractionDigits: 3 });
const percent = new Intl.NumberFormat('en-US', {
  style: 'percent',
  minimumFractionDigits: 1,
  maximumFractionDigits: 1,
  signDisplay: 'exceptZero',
});

/** A value of a comparison with three decimals; a dash where one side has none. */
export function writeValue(value: number | undefined): string {
  return value === undefined ? '–' : figures.format(Math.abs(value) < 5e-4 ? 0 : value).replace('-', '−');
}

/** "+2.5%", or a dash where nothing is reckoned. */
export function writeDifference(change: number | undefined): string {
  return change === undefined ? '–' : percent.format(change).replace('-', '−');
}
