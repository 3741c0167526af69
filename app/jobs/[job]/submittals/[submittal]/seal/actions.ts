'use server';

import { orRefuse, requireActor } from '@/app/session';
import { completeSeal } from '@/lib/services/complete-seal';
import { prepareSeal } from '@/lib/services/prepare-seal';

type Answer<T> = { ok: true; value: T } | { ok: false; message: string };

const said = (errors: { message: string }[]) => errors[0]?.message ?? 'Nothing was sealed.';

export async function prepare(
  submittalId: string,
): Promise<Answer<{ preparedId: string; hole: { from: number; to: number } }>> {
  const actor = await requireActor();
  const prepared = await orRefuse(prepareSeal(actor, { submittalId }));
  return prepared.ok ? prepared : { ok: false, message: said(prepared.errors) };
}

export async function complete(preparedId: string, cms: number[]): Promise<Answer<null>> {
  const actor = await requireActor();
  const sealed = await orRefuse(completeSeal(actor, { preparedId, cms: Uint8Array.from(cms) }));
  return sealed.ok ? sealed : { ok: false, message: said(sealed.errors) };
}
