import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { Hung } from '@/app/components/ledger';
import { Page } from '@/app/components/page-layout';
import { SubmitButton } from '@/app/components/submit-button';
import { orRefuse, requireActor } from '@/app/session';
import { dayIn } from '@/lib/services/day-in';
import { openOffice } from '@/lib/services/open-office';
import { clearSecond, submitLicence, submitPerson, withdraw } from './actions';
import { LicenceForm } from './licence-form';
import { LicenceList } from './licence-list';
import { PersonForm } from './person-form';

interface Props {
  params: Promise<{ person: string }>;
}

export const metadata: Metadata = { title: 'Person' };

/** One person of the office, for the administrator: roles, account, licences. */
export default async function PersonPage({ params }: Props) {
  const actor = await requireActor();
  if (!actor.roles.includes('administrator')) forbidden();
  const { person: id } = await params;
  const person = (await orRefuse(openOffice(actor))).people.find((p) => p.id === id);
  if (!person) notFound();
  return (
    <Page
      wide
      path={[{ label: 'Office', href: '/office' }, { label: person.name }]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        person.active ? 'account open' : 'account closed',
        <span key="zone" className="end">{`Times in ${actor.zone}`}</span>,
      ]}
    >
      <Hung at="top" number={person.initials}>
        <h1>{person.name}</h1>
        <p className="facts">
          <span>{person.email}</span>
        </p>
        <PersonForm action={submitPerson.bind(null, id)} person={person} />
      </Hung>
      {person.secondFactor ? (
        <Hung at="section">
          <h2>Second factor</h2>
          <p className="i2 max-w-[676px]">
            On. Take it off only for a person who lost the device and the recovery codes, and be sure who
            asks: the password alone then signs in. Every session of this person ends.
          </p>
          <form action={clearSecond.bind(null, id)} className="row">
            <SubmitButton tone="plain">Take off the second factor</SubmitButton>
          </form>
        </Hung>
      ) : null}
      {person.roles.includes('engineer-of-record') || person.licences.length > 0 ? (
        <Hung at="section">
          <h2>Licences</h2>
          <LicenceList licences={person.licences} today={dayIn(actor.zone, new Date())} withdraw={withdraw} />
        </Hung>
      ) : null}
      {person.roles.includes('engineer-of-record') ? (
        <Hung at="section">
          <h2>Enter a licence</h2>
          <LicenceForm action={submitLicence.bind(null, id)} />
        </Hung>
      ) : null}
    </Page>
  );
}
