import { SubmitButton } from '@/app/components/submit-button';

interface Props {
  licences: { id: string; jurisdiction: string; profession: string; number: string; expires: string }[];
  /** Today where the office is, as 2028-06-30. */
  today: string;
  withdraw: (licenceId: string) => Promise<void>;
}

/** Licences in the register; one is withdrawn after a second look. */
export function LicenceList({ licences, today, withdraw }: Props) {
  if (licences.length === 0)
    return <p className="i2">None. Without a licence in force for a job’s jurisdiction nothing is sealed.</p>;
  return (
    <ul className="plainlist max-w-[676px] border-t border-line">
      {licences.map((l) => (
        <li key={l.id}>
          <b className="font-medium">
            {l.jurisdiction}, {l.profession}, {l.number}
          </b>
          <small className="i2 block">
            {l.expires < today ? `expired on ${l.expires}` : `in force to ${l.expires}`}
          </small>
          <details>
            <summary className="t cursor-pointer py-1">Withdraw</summary>
            <p className="i2">Nothing more is sealed with it. What was sealed with it stays sealed.</p>
            <form action={withdraw.bind(null, l.id)} className="py-2">
              <SubmitButton tone="plain" small>
                Withdraw licence {l.number}
              </SubmitButton>
            </form>
          </details>
        </li>
      ))}
    </ul>
  );
}
