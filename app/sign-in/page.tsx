import type { Metadata } from 'next';
import Link from 'next/link';
import { redirect } from 'next/navigation';
import { env } from '@/lib/env';
import { TitlePage } from '../components/title-page';
import { currentActor } from '../session';
import { SignInForm } from './sign-in-form';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage() {
  if (await currentActor()) redirect('/jobs');
  return (
    <TitlePage
      title="Fairhand"
      lead="Calculations in a fair hand: written out in full, checked, sealed, and answered line by line."
      demo={env().demo}
    >
      <SignInForm />
      <p className="s i2 revnote">
        Plan reviewers need no account: open the link in the e-mail you were sent. Anybody can{' '}
        <Link className="t" href="/verify">
          verify a file
        </Link>
        .
      </p>
    </TitlePage>
  );
}
