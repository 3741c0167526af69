import type { DraftSupport } from './draft';
import type { FieldReader } from './field-reader';
import type { Restraint, Support } from './structure';

const degrees = 180 / Math.PI;

/** The restraints a kind of support stands for; springs are read from their fields, blank is free. */
export function readSupport(reader: FieldReader, path: string, s: DraftSupport): Support | undefined {
  const angle = s.angle.trim() === '' ? 0 : reader.read(`${path}.angle`, s.angle, 'angle');
  if (angle === undefined) return undefined;
  const support = (x: Restraint, y: Restraint, turn: Restraint): Support => ({
    angle: angle * degrees,
    x,
    y,
    turn,
  });
  switch (s.kind) {
    case 'free':
      return undefined;
    case 'fixed':
      return support('held', 'held', 'held');
    case 'pinned':
      return support('held', 'held', 'free');
    case 'roller':
      return support('free', 'held', 'free');
    case 'guided':
      return support('free', 'held', 'held');
    case 'spring': {
      const x = reader.optional(`${path}.springX`, s.springX, 'spring', 'A spring stiffness');
      const y = reader.optional(`${path}.springY`, s.springY, 'spring', 'A spring stiffness');
      const turn = reader.optional(`${path}.springTurn`, s.springTurn, 'turnSpring', 'A spring stiffness');
      if (s.springX + s.springY + s.springTurn === '') {
        reader.refuse(`${path}.springY`, 'A spring support needs at least one stiffness.');
      }
      const restraint = (k: number | undefined): Restraint => (k === undefined ? 'free' : { spring: k });
      return support(restraint(x), restraint(y), restraint(turn));
    }
  }
}
