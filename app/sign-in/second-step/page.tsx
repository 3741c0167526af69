import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { TitlePage } from '@/app/components/title-page';
import { currentActor, readStep } from '@/app/session';
import { env } from '@/lib/env';
import { CodeForm } from './code-form';

export const metadata: Metadata = { title: 'Second step' };

/** After the password, the code of a device. */
export default async function SecondStepPage() {
  if (await currentActor()) redirect('/jobs');
  if (!(await readStep())) redirect('/sign-in');
  return (
    <TitlePage
      title="One more step"
      lead="Your account asks for a code beside the password."
      demo={env().demo}
    >
      <CodeForm />
    </TitlePage>
  );
}
