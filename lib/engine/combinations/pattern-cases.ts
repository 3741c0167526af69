import type { Analysis } from '@/lib/model/analysis';
import type { Load, LoadCase } from '@/lib/model/load';

/** A live case split by spans, and the sets of its parts that may act together. */
export interface PatternCases {
  cases: LoadCase[];
  arrangements: string[][];
}

/** Spans of a structure in lines: members that go straight on from joint to joint, each span from support to support. */
export type SpanLines = readonly (readonly (readonly string[])[])[];

/**
 * Pattern loading. Every span that the case loads becomes a case of its own ("L1", "L2", …); the arrangements are all
 * spans, every other span from the first and from the second, and for every inner support both its spans with every other
 * one beyond and, turned about, the spans then left. On a continuous beam these hold the greatest and least moment over
 * every support, the greatest and least reactions, and the greatest and least moment near the middle of every span. With
 * several lines the others carry every other span, in either of both ways. Loads on joints stay with the first span.
 */
export function patternCases(live: LoadCase, lines: SpanLines): PatternCases {
  const spans = lines.flatMap((line, l) => line.map((members, s) => ({ line: l, place: s, members })));
  const cases: LoadCase[] = [];
  const idOf = new Map<(typeof spans)[number], string>();
  const claimed = new Set<Load>();
  for (const span of spans) {
    const loads = live.loads.flatMap((load) => {
      const part = partOn(load, span.members);
      if (part) claimed.add(load);
      return part ? [part] : [];
    });
    if (loads.length === 0) continue;
    const id = `${live.id}${cases.length + 1}`;
    idOf.set(span, id);
    cases.push({ ...live, id, title: `${live.title}, span ${cases.length + 1}`, loads });
  }
  const unclaimed = live.loads.filter((load) => !claimed.has(load));
  const [first] = cases;
  if (!first || cases.length < 2) return { cases: [live], arrangements: [] };
  first.loads = [...first.loads, ...unclaimed];
  const pick = (test: (span: (typeof spans)[number]) => boolean) =>
    spans.filter(test).flatMap((span) => idOf.get(span) ?? []);
  const arrangements = [pick(() => true)];
  for (const odd of [0, 1]) arrangements.push(pick((s) => (s.place + s.line) % 2 === odd));
  lines.forEach((line, l) => {
    for (let support = 1; support < line.length; support++) {
      const besides = (place: number) => (place < support ? support - 1 - place : place - support) % 2 === 0;
      for (const turned of [false, true]) {
        for (const odd of lines.length > 1 ? [0, 1] : [0]) {
          arrangements.push(
            pick((s) => (s.line === l ? besides(s.place) !== turned : (s.place + s.line) % 2 === odd)),
          );
        }
      }
    }
  });
  return { cases, arrangements: distinct(arrangements) };
}

/** The load as far as it acts on these members. */
function partOn(load: Load, members: readonly string[]): Load | undefined {
  if (load.kind === 'joint' || load.kind === 'settlement') return undefined;
  if (load.kind !== 'self-weight') return members.includes(load.member) ? load : undefined;
  const own = members.filter((id) => load.members === undefined || load.members.includes(id));
  return own.length === 0 ? undefined : { ...load, members: own };
}

function distinct(lists: readonly string[][]): string[][] {
  const found = new Map(lists.filter((l) => l.length > 0).map((l) => [l.join(' '), l]));
  return [...found.values()];
}

/**
 * Lines of spans of a structure, left to right: members joined end to end in one direction, cut where a support, or a
 * member in another direction, meets them. Members steeper than 45° are columns and no spans.
 */
export function spanLines({ joints, members }: Pick<Analysis, 'joints' | 'members'>): string[][][] {
  const at = new Map(joints.map((j) => [j.id, j]));
  const flat = members.flatMap((m) => {
    const [a, b] = [at.get(m.start), at.get(m.end)];
    if (!a || !b || Math.abs(b.y - a.y) > Math.abs(b.x - a.x)) return [];
    const [left, right] = a.x < b.x ? [a, b] : [b, a];
    return [{ id: m.id, left, right, slope: (right.y - left.y) / (right.x - left.x) }];
  });
  const next = (m: (typeof flat)[number]) =>
    flat.find((n) => n.left.id === m.right.id && Math.abs(n.slope - m.slope) < 1e-9);
  const follows = new Set(flat.map(next));
  const met = new Map<string, number>();
  for (const m of members) for (const id of [m.start, m.end]) met.set(id, (met.get(id) ?? 0) + 1);
  const bears = (id: string) => {
    const support = at.get(id)?.support;
    const held = support !== undefined && (support.x !== 'free' || support.y !== 'free');
    return held || (met.get(id) ?? 0) > 2;
  };
  return flat
    .filter((m) => !follows.has(m))
    .map((start) => {
      const line: string[][] = [[]];
      for (let m: (typeof flat)[number] | undefined = start; m; m = next(m)) {
        line.at(-1)?.push(m.id);
        if (bears(m.right.id) && next(m)) line.push([]);
      }
      return line;
    });
}
