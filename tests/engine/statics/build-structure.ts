import type { AnalysisInput } from '@/lib/model/analysis';
import type { Support } from '@/lib/model/structure';

type Joint = AnalysisInput['joints'][number];
type Member = AnalysisInput['members'][number];
type Case = AnalysisInput['cases'][number];

const kinds = {
  fixed: { x: 'held', y: 'held', turn: 'held' },
  pin: { x: 'held', y: 'held', turn: 'free' },
  roller: { x: 'free', y: 'held', turn: 'free' },
  /** Rolls up and down. */
  wall: { x: 'held', y: 'free', turn: 'free' },
  guided: { x: 'free', y: 'held', turn: 'held' },
  /** Turning alone is held. */
  clamp: { x: 'free', y: 'free', turn: 'held' },
} as const;

/** "A 0 0 pin", "B 6 0 roller 30", "C 3 4": name, place, support and its angle. */
export function joints(...lines: string[]): Joint[] {
  return lines.map((line) => {
    const [id = '', x, y, kind, angle] = line.split(' ');
    const support: Partial<Support> | undefined =
      kind === undefined ? undefined : { ...kinds[kind as keyof typeof kinds], angle: Number(angle ?? 0) };
    return { id, x: Number(x), y: Number(y), support } as Joint;
  });
}

/** "AB", "A-B" with releases after it: "AB moment@end axial@start". All have EI = 1000. */
export function members(...lines: string[]): Member[] {
  return lines.map((line) => {
    const [name = '', ...words] = line.split(' ');
    const [start, end] = name.includes('-') ? name.split('-') : [name.charAt(0), name.charAt(1)];
    const at = (e: string) =>
      words.filter((w) => w.endsWith(`@${e}`)).map((w) => w.split('@')[0] as 'moment' | 'shear' | 'axial');
    const releases = words.length > 0 ? { start: at('start'), end: at('end') } : undefined;
    return { id: name, start: start ?? '', end: end ?? '', EI: 1000, releases };
  });
}

/** A structure in kN and m; without cases it carries a unit load nowhere. */
export function structure(
  joint: Joint[],
  member: Member[],
  cases: Case[] = [{ id: 'P', title: 'nothing', nature: 'other', loads: [] }],
): AnalysisInput {
  return {
    form: 'fairhand.analysis/1',
    units: 'SI',
    basis: { kind: 'absolute' },
    joints: joint,
    members: member,
    cases,
  };
}
