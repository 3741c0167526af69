import type { ReactNode } from 'react';

/** Nothing here yet: says so, and what to do. */
export function Empty({ title, children }: { title: string; children?: ReactNode }) {
  return (
    <div className="max-w-[620px] py-6">
      <h3>{title}</h3>
      {children ? <div className="text-ink2">{children}</div> : null}
    </div>
  );
}
