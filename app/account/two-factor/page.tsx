import type { Metadata } from 'next';
import { Hung } from '@/app/components/ledger';
import { Page } from '@/app/components/page-layout';
import { orRefuse, requireActor } from '@/app/session';
import { readSecondFactor } from '@/lib/services/second-factor/read-second-factor';
import { TurnOff } from './turn-off';
import { TurnOn } from './turn-on';

export const metadata: Metadata = { title: 'Second factor' };

/** A code from a device beside the password: on, off, and what is left of the recovery codes. */
export default async function TwoFactorPage() {
  const actor = await requireActor();
  const { on, codesLeft, neededToSeal } = await orRefuse(readSecondFactor(actor));
  return (
    <Page
      wide
      path={[{ label: 'Your account', href: '/account' }, { label: 'Second factor' }]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        actor.email,
      ]}
    >
      <Hung at="top" number={actor.initials}>
        <h1>Second factor</h1>
        <p className="i2 max-w-[676px]">
          {on
            ? `On. ${codesLeft === 1 ? 'One recovery code is' : `${codesLeft} recovery codes are`} left. Every sign-in asks for a code.`
            : 'Off. Your password alone signs you in.'}{' '}
          {neededToSeal ? 'Your office asks for it before sealing.' : ''}
        </p>
        {on ? <TurnOff /> : <TurnOn />}
      </Hung>
    </Page>
  );
}
