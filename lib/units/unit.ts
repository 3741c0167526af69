import type { Dimension } from './dimension';

/**
 * Units a person may type, with exact factors to newton, metre and kelvin.
 * International yard and pound agreement of 1959: 1 ft = 0.3048 m and 1 lb = 0.45359237 kg exactly; standard gravity
 * 9.80665 m/s² exactly (3rd CGPM, 1901), so 1 lbf = 4.4482216152605 N exactly.
 */
export interface Unit {
  factor: number;
  dimension: Dimension;
  /** Pure-number units (deg, rad, %) are typed after numbers as well. */
  tex: string;
}

const force = { force: 1, length: 0, temperature: 0 };
const length = { force: 0, length: 1, temperature: 0 };
const perLength = { force: 1, length: -1, temperature: 0 };
const perArea = { force: 1, length: -2, temperature: 0 };
const perVolume = { force: 1, length: -3, temperature: 0 };
const temperature = { force: 0, length: 0, temperature: 1 };
const none = { force: 0, length: 0, temperature: 0 };

const lbf = 4.4482216152605;
const foot = 0.3048;
const inch = 0.0254;

const unit = (factor: number, dimension: Dimension, tex: string): Unit => ({ factor, dimension, tex });

export const units: Readonly<Record<string, Unit>> = {
  N: unit(1, force, '\\mathrm{N}'),
  kN: unit(1e3, force, '\\mathrm{kN}'),
  MN: unit(1e6, force, '\\mathrm{MN}'),
  lb: unit(lbf, force, '\\mathrm{lb}'),
  lbf: unit(lbf, force, '\\mathrm{lb}'),
  lbs: unit(lbf, force, '\\mathrm{lb}'),
  kip: unit(1e3 * lbf, force, '\\mathrm{kip}'),
  kips: unit(1e3 * lbf, force, '\\mathrm{kip}'),
  k: unit(1e3 * lbf, force, '\\mathrm{kip}'),
  m: unit(1, length, '\\mathrm{m}'),
  cm: unit(1e-2, length, '\\mathrm{cm}'),
  mm: unit(1e-3, length, '\\mathrm{mm}'),
  ft: unit(foot, length, '\\mathrm{ft}'),
  in: unit(inch, length, '\\mathrm{in}'),
  Pa: unit(1, perArea, '\\mathrm{Pa}'),
  kPa: unit(1e3, perArea, '\\mathrm{kPa}'),
  MPa: unit(1e6, perArea, '\\mathrm{MPa}'),
  GPa: unit(1e9, perArea, '\\mathrm{GPa}'),
  psi: unit(lbf / inch ** 2, perArea, '\\mathrm{psi}'),
  ksi: unit((1e3 * lbf) / inch ** 2, perArea, '\\mathrm{ksi}'),
  psf: unit(lbf / foot ** 2, perArea, '\\mathrm{psf}'),
  ksf: unit((1e3 * lbf) / foot ** 2, perArea, '\\mathrm{ksf}'),
  plf: unit(lbf / foot, perLength, '\\mathrm{plf}'),
  klf: unit((1e3 * lbf) / foot, perLength, '\\mathrm{klf}'),
  pcf: unit(lbf / foot ** 3, perVolume, '\\mathrm{pcf}'),
  K: unit(1, temperature, '\\mathrm{K}'),
  degC: unit(1, temperature, '{}^\\circ\\mathrm{C}'),
  degF: unit(5 / 9, temperature, '{}^\\circ\\mathrm{F}'),
  deg: unit(Math.PI / 180, none, '^\\circ'),
  rad: unit(1, none, '\\mathrm{rad}'),
};
