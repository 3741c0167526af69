import fc from 'fast-check';
import type { AnalysisInput } from '@/lib/model/analysis';
import type { Support } from '@/lib/model/structure';

export type Joint = AnalysisInput['joints'][number];
export type Member = AnalysisInput['members'][number];
export type Load = AnalysisInput['cases'][number]['loads'][number];

const supports = {
  fixed: { x: 'held', y: 'held', turn: 'held' },
  pinned: { x: 'held', y: 'held', turn: 'free' },
  roller: { x: 'free', y: 'held', turn: 'free' },
  guided: { x: 'free', y: 'held', turn: 'held' },
} as const;

/** Numbers of ordinary size with few figures, so that a failing case can be read. */
export const between = (min: number, max: number) =>
  fc.integer({ min: 0, max: 1000 }).map((k) => Number((min + ((max - min) * k) / 1000).toPrecision(4)));

const stiffness = between(5e3, 8e4);
const support: fc.Arbitrary<Partial<Support> | undefined> = fc.oneof(
  {
    weight: 3,
    arbitrary: fc.constantFrom(supports.fixed, supports.pinned, supports.roller, supports.guided),
  },
  {
    weight: 1,
    arbitrary: fc.record({ angle: between(-60, 60) }).map((a) => ({ ...a, ...supports.roller })),
  },
  {
    weight: 1,
    arbitrary: between(500, 5e4).map(
      (k) => ({ x: 'free', y: { spring: k }, turn: { spring: 2 * k } }) as const,
    ),
  },
);

interface Style {
  EA: boolean;
  GAs: boolean;
  stepped: boolean;
}

const style: fc.Arbitrary<Style> = fc.record({
  EA: fc.boolean(),
  GAs: fc.integer({ min: 0, max: 3 }).map((k) => k === 0),
  stepped: fc.integer({ min: 0, max: 3 }).map((k) => k === 0),
});

function finish(
  joints: Joint[],
  pairs: readonly (readonly [string, string])[],
  s: Style,
): fc.Arbitrary<AnalysisInput> {
  const at = new Map(joints.map((j) => [j.id, j]));
  const lengthOf = (a: string, b: string) => {
    const [p, q] = [at.get(a), at.get(b)];
    if (!p || !q) throw new Error('a member between joints that are not there');
    return Math.hypot(q.x - p.x, q.y - p.y);
  };
  const members = fc.tuple(
    ...pairs.map(([start, end]) =>
      fc
        .record({ EI: stiffness, area: between(2e5, 4e6), hinge: fc.integer({ min: 0, max: 19 }) })
        .map(({ EI, area, hinge }): Member => {
          const L = lengthOf(start, end);
          const own = { EI, ...(s.EA ? { EA: area } : {}), ...(s.GAs ? { GAs: area / 20 } : {}) };
          const kind = hinge === 2 ? 'shear' : hinge === 3 ? 'axial' : 'moment';
          const releases = hinge < 4 ? { [hinge % 2 === 0 ? 'start' : 'end']: [kind] } : undefined;
          const steps = s.stepped
            ? [{ from: Number((L / 3).toPrecision(3)), ...own, EI: EI / 2 }]
            : undefined;
          return {
            id: `${start}-${end}`,
            start,
            end,
            ...own,
            steps,
            releases,
            alpha: 1.2e-5,
            depth: 0.4,
            weight: 2,
          };
        }),
    ),
  );
  return members.chain((list) =>
    fc.tuple(loadsOn(joints, list, lengthOf), loadsOn(joints, list, lengthOf)).map(([one, two]) => ({
      form: 'fairhand.analysis/1' as const,
      units: 'SI' as const,
      basis: { kind: 'absolute' as const },
      joints,
      members: list,
      cases: [
        { id: 'A', title: 'one', nature: 'other' as const, loads: one },
        { id: 'B', title: 'other', nature: 'other' as const, loads: two },
      ],
    })),
  );
}

function loadsOn(
  joints: readonly Joint[],
  members: readonly Member[],
  lengthOf: (a: string, b: string) => number,
): fc.Arbitrary<Load[]> {
  const member = fc.constantFrom(...members);
  const direction = fc.constantFrom('x' as const, 'y' as const, 'along' as const, 'across' as const);
  const places = fc.tuple(between(0, 1), between(0, 1));
  const held = joints.filter((j) => j.support?.y === 'held');
  const on = (m: Member, t: number) => Number((t * lengthOf(m.start, m.end) * 0.999).toPrecision(5));
  const options: fc.Arbitrary<Load>[] = [
    fc
      .record({
        m: member,
        direction,
        t: places,
        w1: between(-30, 30),
        w2: between(-30, 30),
        whole: fc.boolean(),
      })
      .map(({ m, direction: d, t, w1, w2, whole }): Load => {
        const [from, to] = [on(m, Math.min(...t) * 0.9), on(m, Math.max(...t) * 0.9 + 0.1)];
        const part = whole ? {} : { from, to };
        return {
          kind: 'distributed',
          member: m.id,
          direction: d,
          per: whole ? 'projection' : 'length',
          w1,
          w2,
          ...part,
        };
      }),
    fc.record({ m: member, direction, t: between(0, 1), value: between(-50, 50) }).map(
      ({ m, direction: d, t, value }): Load => ({
        kind: 'point',
        member: m.id,
        direction: d,
        at: on(m, t),
        value,
      }),
    ),
    fc
      .record({ m: member, t: between(0, 1), value: between(-50, 50) })
      .map(({ m, t, value }): Load => ({ kind: 'couple', member: m.id, at: on(m, t), value })),
    fc
      .record({ j: fc.constantFrom(...joints), x: between(-50, 50), y: between(-50, 50) })
      .map(({ j, x, y }): Load => ({ kind: 'joint', joint: j.id, x, y })),
    fc
      .record({ m: member, rise: between(-30, 30), difference: between(-30, 30) })
      .map(({ m, rise, difference }): Load => ({ kind: 'temperature', member: m.id, rise, difference })),
    fc
      .record({ m: member, value: between(-0.01, 0.01) })
      .map(({ m, value }): Load => ({ kind: 'misfit', member: m.id, value })),
    fc.constant<Load>({ kind: 'self-weight' }),
  ];
  if (held.length > 0) {
    options.push(
      fc
        .record({ j: fc.constantFrom(...held), value: between(-0.02, 0.02) })
        .map(({ j, value }): Load => ({ kind: 'settlement', joint: j.id, component: 'y', value })),
    );
  }
  return fc.array(fc.oneof(...options), { minLength: 1, maxLength: 4 });
}

/** Spans in a line, at any slope; hinges, overhangs, springs. */
export const randomBeam = fc
  .record({
    spans: fc.array(between(2, 12), { minLength: 1, maxLength: 6 }),
    slope: fc.constantFrom(0, 0, 0, 20, -75),
    first: fc.constantFrom(supports.fixed, supports.pinned),
    others: fc.array(fc.option(support, { nil: undefined, freq: 6 }), { minLength: 6, maxLength: 6 }),
    style,
  })
  .chain(({ spans, slope, first, others, style: s }) => {
    const [c, n] = [Math.cos((slope * Math.PI) / 180), Math.sin((slope * Math.PI) / 180)];
    let x = 0;
    const joints: Joint[] = [{ id: '0', x: 0, y: 0, support: first }];
    spans.forEach((L, i) => {
      x += L;
      joints.push({ id: `${i + 1}`, x: x * c, y: x * n, support: others[i] as Support | undefined });
    });
    return finish(
      joints,
      spans.map((_, i) => [`${i}`, `${i + 1}`] as const),
      s,
    );
  });

/** Members growing from a fixed foot in any direction; some tips are supported. */
export const randomTree = fc
  .record({
    branches: fc.array(
      fc.record({
        from: fc.nat(20),
        length: between(2, 8),
        heading: between(0, 360),
        tip: fc.option(support, { nil: undefined, freq: 2 }),
      }),
      { minLength: 2, maxLength: 8 },
    ),
    style,
  })
  .chain(({ branches, style: s }) => {
    const joints: Joint[] = [{ id: '0', x: 0, y: 0, support: supports.fixed }];
    const pairs: [string, string][] = [];
    branches.forEach(({ from, length, heading, tip }, i) => {
      const base = joints[from % joints.length] as Joint;
      const turn = (heading * Math.PI) / 180;
      const id = `${i + 1}`;
      const place = { x: base.x + length * Math.cos(turn), y: base.y + length * Math.sin(turn) };
      joints.push({ id, ...place, support: tip as Support | undefined });
      pairs.push([base.id, id]);
    });
    return finish(joints, pairs, s);
  });

/** Storeys and bays with uneven grids and sloping beams; now and then a brace. */
export const randomGrid = fc
  .record({
    bays: fc.array(between(3, 9), { minLength: 1, maxLength: 3 }),
    storeys: fc.array(between(2.5, 5), { minLength: 1, maxLength: 3 }),
    shift: fc.array(between(-0.8, 0.8), { minLength: 16, maxLength: 16 }),
    foot: fc.constantFrom(supports.fixed, supports.fixed, supports.pinned),
    brace: fc.boolean(),
    style,
  })
  .chain(({ bays, storeys, shift, foot, brace, style: s }) => {
    const joints: Joint[] = [];
    const pairs: [string, string][] = [];
    let y = 0;
    for (let i = 0; i <= storeys.length; i++) {
      let x = 0;
      for (let k = 0; k <= bays.length; k++) {
        const lift = i === 0 ? 0 : (shift[4 * i + k] as number);
        joints.push({ id: `${i}.${k}`, x, y: y + lift, support: i === 0 ? foot : undefined });
        x += k < bays.length ? (bays[k] as number) : 0;
        if (i > 0) pairs.push([`${i - 1}.${k}`, `${i}.${k}`]);
        if (i > 0 && k > 0) pairs.push([`${i}.${k - 1}`, `${i}.${k}`]);
      }
      y += i < storeys.length ? (storeys[i] as number) : 0;
    }
    if (brace) pairs.push(['0.0', '1.1']);
    return finish(joints, pairs, s);
  });

export const randomStructure = fc.oneof(randomBeam, randomTree, randomGrid);
