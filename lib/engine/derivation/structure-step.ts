import { type Context, lengthValue, pureValue } from './context';
import { dimensions } from './dimensions';
import { power, quotient, root, sum, type Value } from './expression';
import { decimalsFor } from './figure-plan';
import type { Placed } from './geometry';
import { placeSymbol } from './load-place';
import type { LoadSymbol } from './load-symbols';
import { type LoadedLength, loadedParts } from './loaded-length';
import { type Relation, relate } from './relation';

/** Step 2: what stands there and what acts on it. */
export interface StructureStep {
  kind: 'structure';
  members: { placed: Placed; length: Value; k: Value; EI?: Value; EA?: Value; GAs?: Value }[];
  /** Springs of supports, by joint and component. */
  springs: { joint: string; component: 'x' | 'y' | 'turn'; stiffness: Value }[];
  loads: readonly LoadSymbol[];
  /** Loaded lengths that are parts of members. */
  parts: LoadedLength[];
  /** Distances of point loads and couples along their members. */
  places: { member: string; value: Value }[];
  /** Length and slope of inclined members. */
  geometry: Relation[];
  /** EI0, when it has a value. */
  EI0?: Value;
}

export function deriveStructure(ctx: Context): StructureStep {
  const { solution, analysis } = ctx;
  const members = [...ctx.placed.values()].map((placed) => describe(ctx, placed));
  const springs = analysis.joints.flatMap(({ id, support }) =>
    (['x', 'y', 'turn'] as const).flatMap((component) => {
      const held = support?.[component];
      if (typeof held !== 'object') return [];
      const dimension = component === 'turn' ? dimensions.moment : dimensions.spring;
      const symbol = { letter: 'k', sub: ctx.names.reaction(id, component).sub };
      const stiffness: Value = {
        kind: 'value',
        symbol,
        value: held.spring,
        dimension,
        decimals: decimalsFor([held.spring], 4, 0, 3),
      };
      return [{ joint: id, component, stiffness }];
    }),
  );
  const { value } = solution.reference;
  return {
    kind: 'structure',
    members,
    springs,
    loads: ctx.loads,
    parts: loadedParts(ctx),
    places: placesOf(ctx),
    geometry: [...ctx.placed.values()].filter((p) => p.lie === 'inclined').flatMap((p) => slopeOf(ctx, p)),
    EI0: value === undefined ? undefined : referenceValue(value),
  };
}

/** EI0 as it is printed wherever it stands. */
export function referenceValue(value: number): Value {
  const decimals = decimalsFor([value], 5, 0, 3);
  return { kind: 'value', symbol: { letter: 'EI0' }, value, dimension: dimensions.stiffness, decimals };
}

function describe(ctx: Context, placed: Placed): StructureStep['members'][number] {
  const { member, L } = placed;
  const reference = referenceStiffness(ctx);
  const big = (value: number | undefined, dimension: Value['dimension']): Value | undefined =>
    value === undefined
      ? undefined
      : { kind: 'value', value, dimension, decimals: decimalsFor([value], 5, 0, 3) };
  const absolute = ctx.analysis.basis.kind === 'absolute';
  return {
    placed,
    length: lengthValue(ctx, ctx.names.length(member.id), L),
    k: pureValue(member.EI / reference, ctx.figures.ratio, { letter: 'k', sub: ctx.names.member(member.id) }),
    EI: absolute ? big(member.EI, dimensions.stiffness) : undefined,
    EA: big(member.EA, dimensions.force),
    GAs: big(member.GAs, dimensions.force),
  };
}

/** EI of a member over this is its k; 1 on sheets whose EI are multiples already. */
export function referenceStiffness(ctx: Context): number {
  return ctx.analysis.basis.kind === 'relative' ? 1 : (ctx.solution.reference.value ?? 1);
}

function placesOf(ctx: Context): StructureStep['places'] {
  const found = new Map<string, StructureStep['places'][number]>();
  for (const c of ctx.analysis.cases) {
    for (const load of c.loads) {
      if (load.kind !== 'point' && load.kind !== 'couple') continue;
      const symbol = placeSymbol(ctx, load.member, load.at);
      found.set(`${load.member} ${load.at}`, {
        member: load.member,
        value: lengthValue(ctx, symbol, load.at),
      });
    }
  }
  return [...found.values()];
}

function slopeOf(ctx: Context, p: Placed): Relation[] {
  const { id } = p.member;
  const plan = lengthValue(ctx, ctx.names.plan(id), Math.abs(p.dx));
  const rise = lengthValue(ctx, ctx.names.rise(id), Math.abs(p.dy));
  const length = lengthValue(ctx, ctx.names.length(id), p.L);
  const figures = { dimension: dimensions.length, decimals: length.decimals };
  const ratio = { dimension: dimensions.pure, decimals: 5 };
  return [
    relate(ctx.names.length(id), root(sum(power(plan, 2), power(rise, 2))), figures),
    relate(ctx.names.cos(id), quotient(plan, length), ratio),
    relate(ctx.names.sin(id), quotient(rise, length), ratio),
  ];
}
