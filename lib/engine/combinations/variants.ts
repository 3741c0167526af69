import type { LoadCase } from '@/lib/model/load';

/** One way in which the cases of a nature may act: a factor per case id; none of them acting is an empty record. */
export type Variant = Readonly<Record<string, number>>;

/** Cases of one nature that act together; absent: as is usual for the nature. */
export type Arrangements = readonly (readonly string[])[];

/** Loads of these natures come from one direction or in one way at a time. */
const oneAtATime = new Set<LoadCase['nature']>([
  'wind',
  'seismic',
  'snow',
  'rain',
  'roof-live',
  'temperature',
]);

/**
 * The ways in which cases of one nature act. Dead loads all act. Live loads act all together, or in the arrangements
 * given. Wind, earthquake, snow, rain, roof live load and temperature act one case at a time. A reversible case acts with
 * either sign.
 */
export function variantsOf(cases: readonly LoadCase[], arrangements: Arrangements = []): Variant[] {
  const [first] = cases;
  if (!first) return [];
  const ids = cases.map((c) => c.id);
  const arranged = arrangements
    .map((list) => list.filter((id) => ids.includes(id)))
    .filter((l) => l.length > 0);
  const spread = new Set(arranged.flat());
  const rest = ids.filter((id) => !spread.has(id));
  const groups = oneAtATime.has(first.nature)
    ? rest.map((id) => [id])
    : arranged.length > 0
      ? arranged.map((list) => [...list, ...rest])
      : [rest];
  return groups.flatMap((group) => signed(group.map((id) => cases.find((c) => c.id === id) as LoadCase)));
}

/** Both signs of every reversible case of a group. */
function signed(group: readonly LoadCase[]): Variant[] {
  return group.reduce<Variant[]>(
    (done, c) => {
      const signs = c.reversible ? [1, -1] : [1];
      return done.flatMap((v) => signs.map((s) => ({ ...v, [c.id]: s })));
    },
    [{}],
  );
}

export function scale(variant: Variant, factor: number): Variant {
  return Object.fromEntries(Object.entries(variant).map(([id, v]) => [id, v * factor]));
}

/** Every choice of one variant of each list, added up. */
export function products(lists: readonly (readonly Variant[])[]): Variant[] {
  return lists.reduce<Variant[]>(
    (done, list) => done.flatMap((a) => list.map((b) => ({ ...a, ...b }))),
    [{}],
  );
}
