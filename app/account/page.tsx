import type { Metadata } from 'next';
import Link from 'next/link';
import { listApiTokens } from '@/lib/services/read-api-token';
import { makers } from '@/lib/services/require-role';
import { Hung } from '../components/ledger';
import { Page } from '../components/page-layout';
import { roleWords } from '../office/role-words';
import { requireActor } from '../session';
import { leaveEverywhere } from './actions';
import { ChangePasswordForm } from './change-password-form';
import { TokenForm } from './token-form';
import { TokenList } from './token-list';

export const metadata: Metadata = { title: 'Your account' };

/** What a person settles for themself. */
export default async function AccountPage() {
  const actor = await requireActor();
  const mayMake = actor.roles.some((r) => makers.includes(r));
  return (
    <Page
      wide
      path={[{ label: 'Your account' }]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        actor.email,
        <span key="zone" className="end">{`Times in ${actor.zone}`}</span>,
      ]}
    >
      <Hung at="top" number={actor.initials}>
        <h1>{actor.name}</h1>
        <p className="facts">
          <span>{actor.email}</span>
          <span>{actor.roles.map((r) => roleWords[r]).join(', ')}</span>
        </p>
      </Hung>
      <Hung at="section">
        <h2>Password</h2>
        <p className="i2">Changing it signs you out on every machine.</p>
        <ChangePasswordForm />
      </Hung>
      <Hung at="section">
        <h2>Second factor</h2>
        <p className="i2 max-w-[676px]">
          A code from a device of yours, asked for beside the password.{' '}
          <Link className="t" href="/account/two-factor">
            Turn it on or off
          </Link>
        </p>
      </Hung>
      {mayMake ? (
        <Hung at="section">
          <h2>Access tokens</h2>
          <p className="i2 max-w-[676px]">
            For a program of your own that has structures solved by POST to <code>/api/v1/analyses</code>. It
            acts as you; revoke it when it is no longer needed. The form it sends is at{' '}
            <a className="t" href="/api/v1/analyses/schema">
              /api/v1/analyses/schema
            </a>
            .
          </p>
          <TokenForm />
          <TokenList tokens={await listApiTokens(actor)} zone={actor.zone} />
        </Hung>
      ) : null}
      <Hung at="section">
        <h2>Sessions</h2>
        <form action={leaveEverywhere} className="max-w-[676px]">
          <p className="i2">A session lasts two weeks from its last use. Nothing you typed is lost.</p>
          <button type="submit" className="btn mt-2">
            Sign out everywhere
          </button>
        </form>
      </Hung>
    </Page>
  );
}
