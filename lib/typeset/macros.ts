/**
 * The macros that a calculation's TeX may use beside KaTeX's own commands. Screen and paper share this table, so a
 * stored block reads the same on both. Blocks are frozen with revisions: add macros, never change what one means.
 */
export const MACROS: Readonly<Record<string, string>> = {
  /** A number's unit, upright after a thin space: 3.60\unit{kN/m}. */
  '\\unit': '\\,\\mathrm{#1}',
  /** A quantity: \qty{3.60}{kN/m}. */
  '\\qty': '{#1}\\,\\mathrm{#2}',
  /** The dot between units: \mathrm{kN\per m}, tight as in kN·m. */
  '\\per': '{\\cdot}',
  /** The differential of an integral: \dd{x}. */
  '\\dd': '\\,\\mathrm{d}#1',
  /** Flexural rigidity, and the reference one that multiples refer to. */
  '\\EI': 'EI',
  '\\EIo': 'EI_0',
};
