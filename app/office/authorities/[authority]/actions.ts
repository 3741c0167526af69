'use server';

import { redirect } from 'next/navigation';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor } from '@/app/session';
import { keepAuthority } from '@/lib/services/keep-authority';

const lines = (value: FormDataEntryValue | null) =>
  String(value ?? '')
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');

/** Keeps an authority; without an id a new one is entered. */
export async function submitAuthority(
  authorityId: string | undefined,
  _: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const kept = await orRefuse(
    keepAuthority(actor, {
      authorityId,
      name: form.get('name'),
      decisions: lines(form.get('decisions')),
      checklist: lines(form.get('checklist')),
      wish: form.get('wish'),
      reviewer: form.get('reviewer') || undefined,
      email: form.get('email') || undefined,
    }),
  );
  if (!kept.ok) return afterRefusal(kept, form);
  redirect('/office');
}
