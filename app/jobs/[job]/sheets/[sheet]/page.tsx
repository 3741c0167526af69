import type { Metadata } from 'next';
import { PageHead } from '@/app/components/page-head';
import { orRefuse, requireActor } from '@/app/session';
import { publishedSets } from '@/lib/engine/combinations/published-sets';
import { openSheet } from '@/lib/services/open-sheet';
import { Desk } from './_desk/desk';

interface Props {
  params: Promise<{ job: string; sheet: string }>;
}

export const metadata: Metadata = { title: 'Sheet' };

/** The desk of one sheet. */
export default async function SheetPage({ params }: Props) {
  const actor = await requireActor();
  const { sheet: id } = await params;
  const { job, sheet, draft, version, keptAt, revisions } = await orRefuse(openSheet(actor, id));
  const newest = revisions[0];
  return (
    <div className="book deskp">
      <PageHead
        path={[
          { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
          { label: `${sheet.number} ${sheet.title}` },
        ]}
        actor={actor}
      />
      <Desk
        sheet={sheet}
        initial={draft}
        version={version}
        keptAt={keptAt.toISOString()}
        sets={publishedSets.map(({ key, title }) => ({ key, title }))}
        imprint={[
          actor.officeName,
          job.number,
          sheet.number,
          newest ? `draft after rev ${newest.number}` : 'draft',
          `by ${actor.initials}`,
        ]}
      />
    </div>
  );
}
