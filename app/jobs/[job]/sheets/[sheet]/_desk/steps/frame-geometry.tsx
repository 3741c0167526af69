'use client';

import type { DraftJoint, DraftMember } from '@/lib/model/draft';
import { blankStiffness, blankSupport } from '@/lib/model/starting-draft';
import { useDesk } from '../desk-context';
import { CellTable } from '../table/cell-table';
import type { Column } from '../table/column';
import { writeAtPath } from '../write-at-path';
import { stiffnessColumns } from './stiffness-columns';

const hinge = [
  { value: '', label: 'rigid' },
  { value: 'hinge', label: 'hinge' },
];

/** Any plane frame by its joints and members. */
export function FrameGeometry({ joints, members }: { joints: DraftJoint[]; members: DraftMember[] }) {
  const { draft, change } = useDesk();
  const unit = draft.units === 'US' ? 'ft' : 'm';
  const place = (axis: 'x' | 'y'): Column<DraftJoint> => ({
    key: axis,
    head: axis,
    unit,
    width: '112px',
    align: 'right',
    kind: 'length',
    field: axis,
    read: (row) => row[axis],
    write: (row, text) => ({ ...row, [axis]: text }),
  });
  const joint: Column<DraftJoint>[] = [
    {
      key: 'id',
      head: 'Joint',
      width: '80px',
      field: 'id',
      read: (r) => r.id,
      write: (r, id) => ({ ...r, id }),
    },
    place('x'),
    place('y'),
  ];
  const names = joints.map((j) => ({ value: j.id, label: j.id }));
  const end = (key: 'start' | 'end', head: string): Column<DraftMember> => ({
    key,
    head,
    width: '68px',
    field: key,
    options: names,
    read: (row) => row[key],
    write: (row, text) => ({ ...row, [key]: text }),
  });
  const held = (key: 'startHinge' | 'endHinge', head: string): Column<DraftMember> => ({
    key,
    head,
    width: '84px',
    field: key,
    options: hinge,
    read: (row) => (row[key] ? 'hinge' : ''),
    write: (row, text) => ({ ...row, [key]: text === 'hinge' }),
  });
  const member: Column<DraftMember>[] = [
    end('start', 'From'),
    end('end', 'To'),
    held('startHinge', 'at from'),
    held('endHinge', 'at to'),
    ...stiffnessColumns<DraftMember>(draft),
  ];
  return (
    <>
      <h3 className="mt-3">Joints</h3>
      <CellTable
        pathOf={(i) => `geometry.joints.${i}`}
        label="Joints"
        rows={joints}
        columns={joint}
        onRows={(next, name) => change(name, (d) => writeAtPath(d, 'geometry.joints', next))}
        add={{ label: 'Add a joint', blank: blankJoint }}
        refOf={(row) => ({ of: 'joint', id: row.id })}
      />
      <h3 className="mt-5">Members</h3>
      <CellTable
        pathOf={(i) => `geometry.members.${i}`}
        label="Members"
        rows={members}
        columns={member}
        onRows={(next, name) => change(name, (d) => writeAtPath(d, 'geometry.members', next))}
        add={{ label: 'Add a member', blank: (rows) => blankMember(rows, joints) }}
        refOf={(row) => ({ of: 'member', id: `${row.start}-${row.end}` })}
      />
    </>
  );
}

function blankJoint(rows: readonly DraftJoint[]): DraftJoint {
  return { id: nextName(rows), x: '', y: '', support: blankSupport('free') };
}

/** A new member goes on from where the last one ended, as stiff as it. */
function blankMember(rows: readonly DraftMember[], joints: readonly DraftJoint[]): DraftMember {
  const last = rows.at(-1);
  return {
    start: last?.end ?? joints[0]?.id ?? '',
    end: '',
    startHinge: false,
    endHinge: false,
    stiffness: { ...(last?.stiffness ?? blankStiffness()) },
  };
}

/** The number after the greatest one in use. */
function nextName(rows: readonly DraftJoint[]): string {
  const used = rows.map((r) => Number(r.id)).filter(Number.isInteger);
  return String(Math.max(0, ...used) + 1);
}
