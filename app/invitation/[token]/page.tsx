import type { Metadata } from 'next';
import { PasswordForm } from '../../components/password-form';
import { TitlePage } from '../../components/title-page';
import { submitInvitation } from './actions';

export const metadata: Metadata = { title: 'You are invited', referrer: 'no-referrer' };

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  return (
    <TitlePage
      title="You are invited"
      lead="Choose a password; then sign in with the address the invitation was sent to."
    >
      <PasswordForm token={token} button="Accept the invitation" send={submitInvitation} />
    </TitlePage>
  );
}
