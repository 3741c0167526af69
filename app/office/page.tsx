import type { Metadata } from 'next';
import { openOffice } from '@/lib/services/open-office';
import { Hung, Ledger, LedgerRow } from '../components/ledger';
import { Page } from '../components/page-layout';
import { orRefuse, requireActor } from '../session';
import { InviteForm } from './invite-form';
import { roleWords } from './role-words';

export const metadata: Metadata = { title: 'Office' };

export default async function OfficePage() {
  const actor = await requireActor();
  const { people, authorities } = await orRefuse(openOffice(actor));
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
      </Hung>
      <Hung at="first">
        <h2>People</h2>
      </Hung>
      <Ledger kind="jobs">
        {people.map((person) => (
          <LedgerRow key={person.id} number={person.initials}>
            <span>
              <b>{person.name}</b>
              <small className="i2 [overflow-wrap:anywhere]">{person.email}</small>
            </span>
            <span>{person.roles.map((r) => roleWords[r]).join(', ')}</span>
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
                <b className="font-medium">{a.name}</b>
                <small className="i2 block">decides: {a.decisions.join(', ')}</small>
              </li>
            ))}
          </ul>
        )}
      </Hung>
      {actor.roles.includes('administrator') ? (
        <Hung at="section">
          <h2>Invite a person</h2>
          <InviteForm />
        </Hung>
      ) : null}
    </Page>
  );
}
