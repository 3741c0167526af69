import type { Metadata } from 'next';
import { PasswordForm } from '../../components/password-form';
import { TitlePage } from '../../components/title-page';
import { submitPassword } from './actions';

export const metadata: Metadata = { title: 'Choose a new password', referrer: 'no-referrer' };

export default async function ResetPasswordPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  return (
    <TitlePage
      title="Choose a new password"
      lead="The link works once. Every place where you are signed in is signed out."
    >
      <PasswordForm token={token} button="Set the password" send={submitPassword} />
    </TitlePage>
  );
}
