import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { env } from '@/lib/env';
import { readDemoMail } from '@/lib/services/read-demo-mail';
import { Empty } from '../../components/empty';
import { Hung, Ledger, LedgerRow } from '../../components/ledger';
import { Page } from '../../components/page-layout';
import { sayMoment } from '../../components/say-date';
import { currentActor, orRefuse } from '../../session';

export const metadata: Metadata = { title: 'Mail of this demonstration', robots: 'noindex' };
export const dynamic = 'force-dynamic';

export default async function DemoMailPage() {
  if (!env().demo) notFound();
  const [actor, mails] = await Promise.all([currentActor(), orRefuse(readDemoMail())]);
  const zone = actor?.zone ?? 'UTC';
  return (
    <Page
      wide
      path={[{ label: 'Mail of this demonstration' }]}
      actor={actor}
      foot={[`${mails.length} kept here`, <span key="zone" className="end">{`Times in ${zone}`}</span>]}
    >
      <Hung at="top">
        <h1>Mail of this demonstration</h1>
        <p className="lead3">
          A demonstration sends no mail out of this machine. What would have been sent is kept here, newest
          first. Anyone who can open this page can follow its links.
        </p>
      </Hung>
      {mails.length === 0 ? (
        <Hung at="section">
          <Empty title="Nothing was mailed yet.">
            Invite a person, ask for a new password, or send a submittal.
          </Empty>
        </Hung>
      ) : (
        <Ledger>
          {mails.map((mail) => (
            <LedgerRow key={mail.id} number={sayMoment(mail.at, zone)}>
              <details>
                <summary className="cursor-pointer">
                  <b className="font-medium">{mail.subject}</b> <span className="i2">to {mail.to}</span>
                </summary>
                <MailText text={mail.text} />
              </details>
            </LedgerRow>
          ))}
        </Ledger>
      )}
    </Page>
  );
}

/** The text of a mail; only links into this application can be followed. */
function MailText({ text }: { text: string }) {
  const parts = text.split(/(https?:\/\/[^\s<>"]+)/);
  return (
    <div className="mt-2 max-w-[676px] whitespace-pre-wrap [overflow-wrap:anywhere]">
      {parts.map((part) =>
        part.startsWith(`${env().appUrl}/`) ? (
          <a key={part} className="t" href={part}>
            {part}
          </a>
        ) : (
          part
        ),
      )}
    </div>
  );
}
