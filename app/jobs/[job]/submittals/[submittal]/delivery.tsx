import type { FormState } from '@/app/components/form-state';
import { sayDate, sayMoment } from '@/app/components/say-date';
import { SubmitButton } from '@/app/components/submit-button';
import type { openSubmittal } from '@/lib/services/open-submittal';
import { ResendForm } from './resend-form';

type Opened = Awaited<ReturnType<typeof openSubmittal>>;

interface Props {
  opened: Pick<Opened, 'transmittals' | 'mails' | 'links'>;
  zone: string;
  /** Absent for those who do not send. */
  resend: ((mailId: string, state: FormState) => Promise<FormState>) | undefined;
  revoke: ((linkId: string | undefined) => Promise<void>) | undefined;
}

const states: Record<Opened['mails'][number]['state'], string> = {
  queued: 'waits to be sent',
  sending: 'is being sent',
  accepted: 'accepted by the mail server',
  refused: 'refused by the mail server',
};

/** Where the package went: transmittals, letters in the words of the mail server, and the links. */
export function Delivery({ opened, zone, resend, revoke }: Props) {
  const { transmittals, mails, links } = opened;
  if (transmittals.length === 0) return <p>Not sent yet.</p>;
  return (
    <ul className="plain">
      {transmittals.map((t) => (
        <li key={t.id}>
          Transmittal {t.number} to {t.recipient}, {sayMoment(t.sent_at, zone)}
          {t.action === '' ? null : <small className="i2 block">Asked for: {t.action}</small>}
          {t.seen_to.length > 0 ? (
            <small className="i2 block">Seen to before sending: {t.seen_to.join('; ')}</small>
          ) : null}
        </li>
      ))}
      {mails.map((m) => (
        <li key={m.id}>
          Letter to {m.recipient}
          {Number(m.attached) ? ' with the package attached' : ''}: {states[m.state]}
          {m.server_words === '' ? '' : `. The server said: ${m.server_words}`}
          {m.state === 'refused' && resend ? (
            <ResendForm action={resend.bind(null, m.id)} recipient={m.recipient} />
          ) : null}
        </li>
      ))}
      {links.map((l) => (
        <li key={l.id}>
          Link for {l.reviewer}: {l.openedAt ? `opened ${sayMoment(l.openedAt, zone)}` : 'not opened yet'},{' '}
          {standing(l, zone)}
          {revoke && isGood(l) ? (
            <form action={revoke.bind(null, l.id)}>
              <SubmitButton tone="plain" small>
                Revoke the link for {l.reviewer}
              </SubmitButton>
            </form>
          ) : null}
        </li>
      ))}
    </ul>
  );
}

type Link = Opened['links'][number];

const isGood = (link: Link) => !link.revokedAt && link.expiresAt >= new Date();

function standing(link: Link, zone: string): string {
  if (link.revokedAt) return `revoked ${sayMoment(link.revokedAt, zone)}`;
  const day = sayDate(link.expiresAt, zone);
  return isGood(link) ? `good until ${day}` : `ran out on ${day}`;
}
