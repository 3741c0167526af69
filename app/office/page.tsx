import type { Metadata } from 'next';
import Link from 'next/link';
import { openOffice } from '@/lib/services/open-office';
import { Hung, Ledger, LedgerRow } from '../components/ledger';
import { Page } from '../components/page-layout';
import { orRefuse, requireActor } from '../session';
import { InviteForm } from './invite-form';
import { OfficeForm } from './office-form';
import { roleWords } from './role-words';

export const metadata: Metadata = { title: 'Office' };

export default async function OfficePage() {
  const actor = await requireActor();
  const leads = actor.roles.includes('administrator');
  const { people, authorities, settings } = await orRefuse(openOffice(actor));
  return (
    <Page
      wide
      path={[{ label: 'Office' }]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        people.length === 1 ? '1 person' : `${people.length} people`,
        <span key="zone" className="end">{`Times in ${actor.zone}`}</span>,
      ]}
    >
      <Hung at="top">
        <h1>{actor.officeName}</h1>
        <p>
          <Link className="t" href="/office/record">
            Record of the office
          </Link>
        </p>
      </Hung>
      <Hung at="first">
        <h2>People</h2>
      </Hung>
      <Ledger kind="jobs">
        {people.map((person) => (
          <LedgerRow key={person.id} number={person.initials}>
            <span>
              <b>
                {leads ? (
                  <Link className="hover:text-pen" href={`/office/people/${person.id}`}>
                    {person.name}
                  </Link>
                ) : (
                  person.name
                )}
              </b>
              <small className="i2 [overflow-wrap:anywhere]">{person.email}</small>
            </span>
            <span>
              {person.roles.map((r) => roleWords[r]).join(', ')}
              {person.active ? null : <small className="i2 block">account closed</small>}
            </span>
            <span className="i2 s">
              {person.licences.map((l) => (
                <span key={`${l.jurisdiction} ${l.number}`} className="block">
                  {l.jurisdiction} {l.number}, to {l.expires}
                </span>
              ))}
            </span>
          </LedgerRow>
        ))}
      </Ledger>
      <Hung at="section">
        <h2>Authorities</h2>
        {authorities.length === 0 ? (
          <p className="i2">None yet.</p>
        ) : (
          <ul className="plainlist max-w-[676px] border-t border-line">
            {authorities.map((a) => (
              <li key={a.id}>
                <b className="font-medium">
                  {leads ? (
                    <Link className="hover:text-pen" href={`/office/authorities/${a.id}`}>
                      {a.name}
                    </Link>
                  ) : (
                    a.name
                  )}
                </b>
                <small className="i2 block">decides: {a.decisions.join(', ')}</small>
              </li>
            ))}
          </ul>
        )}
        {leads ? (
          <Link className="btn mt-4" href="/office/authorities/new">
            Enter an authority
          </Link>
        ) : null}
      </Hung>
      {leads ? (
        <Hung at="section">
          <h2>Invite a person</h2>
          <InviteForm />
        </Hung>
      ) : null}
      {leads ? (
        <Hung at="section">
          <h2>Settings</h2>
          <OfficeForm lateAfter={settings.lateAfter} sealNeedsSecond={settings.sealNeedsSecond} />
        </Hung>
      ) : null}
    </Page>
  );
}
