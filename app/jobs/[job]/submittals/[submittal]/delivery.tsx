import { sayDate, sayMoment } from '@/app/components/say-date';
import type { openSubmittal } from '@/lib/services/open-submittal';

type Opened = Awaited<ReturnType<typeof openSubmittal>>;

interface Props extends Pick<Opened, 'transmittals' | 'mails' | 'links'> {
  zone: string;
}

const states: Record<Opened['mails'][number]['state'], string> = {
  queued: 'waits to be sent',
  sending: 'is being sent',
  accepted: 'accepted by the mail server',
  refused: 'refused by the mail server',
};

/** Where the package went: transmittals, letters in the words of the mail server, and the links. */
export function Delivery({ transmittals, mails, links, zone }: Props) {
  if (transmittals.length === 0) return <p>Not sent yet.</p>;
  return (
    <ul className="plain">
      {transmittals.map((t) => (
        <li key={t.id}>
          Transmittal {t.number} to {t.recipient}, {sayMoment(t.sent_at, zone)}
        </li>
      ))}
      {mails.map((m) => (
        <li key={m.id}>
          Letter to {m.recipient}: {states[m.state]}
          {m.server_words === '' ? '' : `. The server said: ${m.server_words}`}
        </li>
      ))}
      {links.map((l) => (
        <li key={`${l.email}${l.expiresAt.getTime()}`}>
          Link for {l.reviewer}: {l.openedAt ? `opened ${sayMoment(l.openedAt, zone)}` : 'not opened yet'},{' '}
          {standing(l, zone)}
        </li>
      ))}
    </ul>
  );
}

function standing(link: Opened['links'][number], zone: string): string {
  if (link.revokedAt) return `revoked ${sayMoment(link.revokedAt, zone)}`;
  const day = sayDate(link.expiresAt, zone);
  return link.expiresAt < new Date() ? `ran out on ${day}` : `good until ${day}`;
}
