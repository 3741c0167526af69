import type { Draft, DraftGeometry, DraftStiffness, DraftSupport } from './draft';
import type { FieldReader } from './field-reader';
import { readStiffness } from './read-stiffness';
import { readSupport } from './read-support';
import type { Joint, Member } from './structure';

export interface Geometry {
  joints: Joint[];
  members: Member[];
}

/** Joints and members of any starting shape; what cannot be read is noted at its field and left out. */
export function readGeometry(reader: FieldReader, draft: Draft): Geometry {
  const build = new GeometryBuild(reader, draft);
  const g = draft.geometry;
  switch (g.shape) {
    case 'beam':
      return build.beam(g);
    case 'portal':
      return build.portal(g);
    case 'frame':
      return build.frame(g);
  }
}

class GeometryBuild {
  private readonly made: Geometry = { joints: [], members: [] };

  constructor(
    private readonly reader: FieldReader,
    private readonly draft: Draft,
  ) {}

  beam(g: Extract<DraftGeometry, { shape: 'beam' }>): Geometry {
    if (g.spans.length === 0) this.reader.refuse('geometry.spans', 'A beam needs at least one span.');
    let x: number | undefined = 0;
    for (let i = 0; i <= g.spans.length; i++) {
      this.joint(`geometry.supports.${i}`, `${i + 1}`, x, 0, g.supports[i]);
      const span = g.spans[i];
      if (!span) break;
      const path = `geometry.spans.${i}`;
      const length = this.reader.positive(`${path}.length`, span.length, 'length', 'A span');
      x = x === undefined || length === undefined ? undefined : x + length;
      this.member(`${path}.stiffness`, `${i + 1}`, `${i + 2}`, span.stiffness);
    }
    return this.made;
  }

  portal(g: Extract<DraftGeometry, { shape: 'portal' }>): Geometry {
    const span = this.reader.positive('geometry.span', g.span, 'length', 'The span');
    const left = this.reader.positive('geometry.leftHeight', g.leftHeight, 'length', 'A height');
    const right = this.reader.positive('geometry.rightHeight', g.rightHeight, 'length', 'A height');
    this.joint('geometry.leftBase', '1', 0, 0, g.leftBase);
    this.joint('geometry.leftBase', '2', 0, left);
    this.joint('geometry.rightBase', '3', span, right);
    this.joint('geometry.rightBase', '4', span, 0, g.rightBase);
    this.member('geometry.leftColumn', '1', '2', g.leftColumn);
    this.member('geometry.beam', '2', '3', g.beam);
    this.member('geometry.rightColumn', '3', '4', g.rightColumn);
    return this.made;
  }

  frame(g: Extract<DraftGeometry, { shape: 'frame' }>): Geometry {
    const known = new Set<string>();
    g.joints.forEach((j, i) => {
      const path = `geometry.joints.${i}`;
      if (j.id.trim() === '') this.reader.refuse(`${path}.id`, 'A joint needs a name, such as 5.');
      else if (known.has(j.id)) this.reader.refuse(`${path}.id`, `There is a joint ${j.id} already.`);
      known.add(j.id);
      const x = this.reader.read(`${path}.x`, j.x, 'length');
      const y = this.reader.read(`${path}.y`, j.y, 'length');
      this.joint(`${path}.support`, j.id, x, y, j.support);
    });
    g.members.forEach((m, i) => {
      const path = `geometry.members.${i}`;
      for (const end of ['start', 'end'] as const) {
        if (!known.has(m[end])) {
          const said = m[end] === '' ? 'A joint is missing here.' : `There is no joint ${m[end]}.`;
          this.reader.refuse(`${path}.${end}`, said);
        }
      }
      const releases = {
        start: m.startHinge ? (['moment'] as const) : [],
        end: m.endHinge ? (['moment'] as const) : [],
      };
      this.member(`${path}.stiffness`, m.start, m.end, m.stiffness, {
        start: [...releases.start],
        end: [...releases.end],
      });
    });
    return this.made;
  }

  private joint(path: string, id: string, x?: number, y?: number, support?: DraftSupport): void {
    const read = support ? readSupport(this.reader, path, support) : undefined;
    if (x === undefined || y === undefined) return;
    this.made.joints.push({ id, x, y, support: read });
  }

  private member(
    path: string,
    start: string,
    end: string,
    s: DraftStiffness,
    releases?: Member['releases'],
  ): void {
    const stiffness = readStiffness(this.reader, path, s, this.draft.stiffness);
    if (!stiffness) return;
    const hinged = releases && releases.start.length + releases.end.length > 0;
    this.made.members.push({
      id: `${start}-${end}`,
      start,
      end,
      ...stiffness,
      releases: hinged ? releases : undefined,
    });
  }
}
