import type { listApiTokens } from '@/lib/services/read-api-token';
import { sayDate } from '../components/say-date';
import { revokeToken } from './actions';

interface Props {
  tokens: Awaited<ReturnType<typeof listApiTokens>>;
  zone: string;
}

/** One's own tokens, the newest first, without their secrets. */
export function TokenList({ tokens, zone }: Props) {
  if (tokens.length === 0) return <p className="i2">None yet.</p>;
  return (
    <ul className="plainlist max-w-[676px] border-t border-line">
      {tokens.map((t) => (
        <li key={t.id} className="flex justify-between gap-4">
          <span>
            <b className="font-medium">{t.name}</b>
            <small className="i2 block">
              issued {sayDate(t.madeAt, zone)},{' '}
              {t.revokedAt
                ? `revoked ${sayDate(t.revokedAt, zone)}`
                : `good until ${sayDate(t.expiresAt, zone)}`}
            </small>
          </span>
          {t.revokedAt ? null : (
            <form action={revokeToken.bind(null, t.id)}>
              <button type="submit" className="btn s" aria-label={`Revoke ${t.name}`}>
                Revoke
              </button>
            </form>
          )}
        </li>
      ))}
    </ul>
  );
}
