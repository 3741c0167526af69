import type { Metadata } from 'next';
import { Hung } from '../components/ledger';
import { Page } from '../components/page-layout';
import { currentActor } from '../session';
import { VerifyForm } from './verify-form';
import './verify.css';

export const metadata: Metadata = { title: 'Verify a file' };

/** Where anybody can hold a package against what it says of itself. */
export default async function VerifyPage() {
  const actor = await currentActor();
  return (
    <Page
      wide
      path={[{ label: 'Verify a file' }]}
      actor={actor}
      foot={['Nothing of the file is kept', 'Times in UTC']}
    >
      <Hung at="top">
        <h1>Verify a file</h1>
        <p className="lead3">
          Choose a package that was issued here. You are told who sealed it and when, whether anything was
          changed or added since, and whether its inputs, solved again now, give the results it carries.
        </p>
      </Hung>
      <VerifyForm zone={actor?.zone ?? 'UTC'} />
      <Hung at="section">
        <h2>What this does not say</h2>
        <p className="i2 max-w-[676px]">
          It does not say that the inputs are right, that the method applies, or that a code is met: a second
          run of the same engine is not an independent check. It does not say whether a later submittal took
          the place of this one. A certificate that was withdrawn since may not be known here. The licensed
          engineer answers for the file.
        </p>
      </Hung>
    </Page>
  );
}
