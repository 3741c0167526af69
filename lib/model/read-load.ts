import type { DraftLoad } from './draft';
import type { FieldReader } from './field-reader';
import type { Direction, Load } from './load';

/** Length of every member by id, so that positions may be written with L. */
export type MemberLengths = ReadonlyMap<string, number>;

type Sense = { direction: Direction; sign: 1 | -1 };

const senses: Partial<Record<DraftLoad['direction'], Sense>> = {
  down: { direction: 'y', sign: -1 },
  up: { direction: 'y', sign: 1 },
  right: { direction: 'x', sign: 1 },
  left: { direction: 'x', sign: -1 },
  across: { direction: 'across', sign: 1 },
  along: { direction: 'along', sign: 1 },
};

/** One row of the load table as a load of the model; undefined when a field of it was refused. */
export function readLoad(
  reader: FieldReader,
  path: string,
  row: DraftLoad,
  lengths: MemberLengths,
  joints: ReadonlySet<string>,
): Load | undefined {
  const source = row.source.trim() === '' ? undefined : row.source.trim();
  const at = (field: keyof DraftLoad) => `${path}.${field}`;
  const turn = row.direction === 'clockwise' ? -1 : 1;
  if (row.kind === 'self-weight') {
    if (row.on.trim() !== '' && !lengths.has(row.on))
      return reader.refuse(at('on'), `There is no member ${row.on}.`);
    return { kind: 'self-weight', members: row.on.trim() === '' ? undefined : [row.on], source };
  }
  if (row.kind === 'joint' || row.kind === 'settlement') {
    if (!joints.has(row.on)) return reader.refuse(at('on'), missing('joint', row.on));
    return readAtJoint(reader, at, row, turn, source);
  }
  const L = lengths.get(row.on);
  if (L === undefined) return reader.refuse(at('on'), missing('member', row.on));
  const position = (field: 'from' | 'to') =>
    row[field].trim() === '' ? undefined : reader.read(at(field), row[field], 'length', L);
  switch (row.kind) {
    case 'couple': {
      const value = reader.read(at('first'), row.first, 'couple');
      const from = reader.read(at('from'), row.from, 'length', L);
      if (value === undefined || from === undefined) return undefined;
      return { kind: 'couple', member: row.on, at: from, value: turn * value, source };
    }
    case 'point': {
      const value = reader.read(at('first'), row.first, 'force');
      const from = reader.read(at('from'), row.from, 'length', L);
      const sense = senseOf(reader, at('direction'), row);
      if (value === undefined || from === undefined || !sense) return undefined;
      return {
        kind: 'point',
        member: row.on,
        at: from,
        direction: sense.direction,
        value: sense.sign * value,
        source,
      };
    }
    case 'uniform':
    case 'varying': {
      const w1 = reader.read(at('first'), row.first, 'distributed');
      const w2 = row.kind === 'uniform' ? w1 : reader.read(at('second'), row.second, 'distributed');
      const sense = senseOf(reader, at('direction'), row);
      const from = position('from');
      const to = position('to');
      if (w1 === undefined || w2 === undefined || !sense) return undefined;
      const { direction, sign } = sense;
      return {
        kind: 'distributed',
        member: row.on,
        from,
        to,
        direction,
        per: row.per,
        w1: sign * w1,
        w2: sign * w2,
        source,
      };
    }
    case 'temperature': {
      const rise = row.first.trim() === '' ? 0 : reader.read(at('first'), row.first, 'temperature');
      const difference = row.second.trim() === '' ? 0 : reader.read(at('second'), row.second, 'temperature');
      if (rise === undefined || difference === undefined) return undefined;
      return { kind: 'temperature', member: row.on, rise, difference, source };
    }
    case 'misfit': {
      const value = reader.read(at('first'), row.first, 'movement');
      return value === undefined ? undefined : { kind: 'misfit', member: row.on, value, source };
    }
  }
}

function readAtJoint(
  reader: FieldReader,
  at: (field: keyof DraftLoad) => string,
  row: DraftLoad,
  turn: 1 | -1,
  source: string | undefined,
): Load | undefined {
  const turning = row.direction === 'clockwise' || row.direction === 'counter-clockwise';
  const settling = row.kind === 'settlement';
  const kind = turning ? (settling ? 'rotation' : 'couple') : settling ? 'movement' : 'force';
  const value = reader.read(at('first'), row.first, kind);
  if (value === undefined) return undefined;
  const sense = turning ? undefined : senseOf(reader, at('direction'), row);
  if (!turning && (!sense || sense.direction === 'across' || sense.direction === 'along')) {
    return reader.refuse(at('direction'), 'At a joint a load acts up, down, left, right, or turns.');
  }
  if (settling) {
    const component = turning ? 'turn' : sense?.direction === 'x' ? 'x' : 'y';
    return { kind: 'settlement', joint: row.on, component, value: (sense?.sign ?? turn) * value, source };
  }
  const force = (axis: 'x' | 'y') => (sense?.direction === axis ? sense.sign * value : 0);
  return {
    kind: 'joint',
    joint: row.on,
    x: force('x'),
    y: force('y'),
    couple: turning ? turn * value : 0,
    source,
  };
}

function senseOf(reader: FieldReader, path: string, row: DraftLoad): Sense | undefined {
  return senses[row.direction] ?? reader.refuse(path, 'A force acts up, down, left, right, along or across.');
}

function missing(noun: string, name: string): string {
  return name.trim() === '' ? `A ${noun} is missing here.` : `There is no ${noun} ${name}.`;
}
