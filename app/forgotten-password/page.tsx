import type { Metadata } from 'next';
import { env } from '@/lib/env';
import { TitlePage } from '../components/title-page';
import { AskForm } from './ask-form';

export const metadata: Metadata = { title: 'Set a new password' };

export default function ForgottenPasswordPage() {
  return (
    <TitlePage
      title="Set a new password"
      lead="Type the address you sign in with. A link to set a new password is mailed to it."
      demo={env().demo}
    >
      <AskForm />
    </TitlePage>
  );
}
