import type { Draft, DraftStiffness } from './draft';
import type { FieldReader } from './field-reader';
import type { Member } from './structure';

type Stiffness = Pick<Member, 'EI' | 'EA' | 'GAs' | 'weight' | 'depth' | 'alpha' | 'section'>;

/** EI, and EA and GAs where areas are given, of one member row; blank E, G and α are the sheet's own. */
export function readStiffness(
  reader: FieldReader,
  path: string,
  s: DraftStiffness,
  sheet: Draft['stiffness'],
): Stiffness | undefined {
  const at = (field: keyof DraftStiffness) => `${path}.${field}`;
  const own = s.E.trim() === '' ? sheet.E : s.E;
  const ePath = s.E.trim() === '' ? 'stiffness.E' : at('E');
  const EI =
    sheet.kind === 'relative'
      ? reader.positive(at('k'), s.k, 'number', 'The multiple of EI0')
      : multiply(reader.positive(ePath, own, 'modulus', 'E'), reader.positive(at('I'), s.I, 'inertia', 'I'));
  const A = reader.optional(at('A'), s.A, 'area', 'A');
  const As = reader.optional(at('As'), s.As, 'area', 'The shear area');
  const E = A === undefined ? undefined : reader.positive(ePath, own, 'modulus', 'E');
  const gText = s.G.trim() === '' ? sheet.G : s.G;
  const gPath = s.G.trim() === '' ? 'stiffness.G' : at('G');
  const G = As === undefined ? undefined : reader.positive(gPath, gText, 'modulus', 'G');
  const weight = reader.optional(at('weight'), s.weight, 'distributed', 'The own weight');
  const depth = reader.optional(at('depth'), s.depth, 'sectionLength', 'The depth');
  const alpha = reader.optional('stiffness.alpha', sheet.alpha, 'expansion', 'The coefficient of expansion');
  if (EI === undefined) return undefined;
  return {
    EI,
    EA: multiply(E, A),
    GAs: multiply(G, As),
    weight,
    depth,
    alpha,
    section: s.section.trim() === '' ? undefined : s.section.trim(),
  };
}

function multiply(a: number | undefined, b: number | undefined): number | undefined {
  return a === undefined || b === undefined ? undefined : a * b;
}
