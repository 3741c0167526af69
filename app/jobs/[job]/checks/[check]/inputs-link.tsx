import Link from 'next/link';
import type { CheckMark } from './check-mark';

interface Props {
  href: string;
  all: number;
  asked: boolean;
  marks: CheckMark[];
}

/** How many inputs were held against drawings, and the way there. */
export function InputsLink({ href, all, asked, marks }: Props) {
  const held = marks.filter((m) => m.place === 'input').length;
  return (
    <p>
      <Link className="t" href={href}>
        Inputs against drawings
      </Link>
      : {held} of {all}
      {asked ? ', all asked for' : ''}
    </p>
  );
}
