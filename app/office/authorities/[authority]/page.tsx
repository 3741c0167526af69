import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { Hung } from '@/app/components/ledger';
import { Page } from '@/app/components/page-layout';
import { orRefuse, requireActor } from '@/app/session';
import { openOffice } from '@/lib/services/open-office';
import { submitAuthority } from './actions';
import { AuthorityForm } from './authority-form';

interface Props {
  params: Promise<{ authority: string }>;
}

export const metadata: Metadata = { title: 'Authority' };

/** One authority that the office submits to, or a new one. */
export default async function AuthorityPage({ params }: Props) {
  const actor = await requireActor();
  if (!actor.roles.includes('administrator')) forbidden();
  const { authority: id } = await params;
  const isNew = id === 'new';
  const authority = isNew
    ? undefined
    : (await orRefuse(openOffice(actor))).authorities.find((a) => a.id === id);
  if (!isNew && !authority) notFound();
  const title = authority?.name ?? 'New authority';
  return (
    <Page
      wide
      path={[{ label: 'Office', href: '/office' }, { label: title }]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
      ]}
    >
      <Hung at="top">
        <h1>{title}</h1>
        <AuthorityForm action={submitAuthority.bind(null, authority?.id)} authority={authority} />
      </Hung>
    </Page>
  );
}
