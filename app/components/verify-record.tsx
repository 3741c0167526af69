'use client';

import { useActionState } from 'react';
import { FormMessage } from './form-message';
import type { FormState } from './form-state';
import { untouched } from './form-state';
import { SubmitButton } from './submit-button';
import { verifyRecord } from './verify-record-action';

/** Walks the chain of the whole office now and says in words what was found. */
export function VerifyRecord({ lastNight }: { lastNight: string }) {
  const [state, action] = useActionState<FormState>(verifyRecord, untouched);
  return (
    <form action={action} className="max-w-[676px]">
      <p className="i2">
        Each entry holds the hash of the one before it, so that none can be changed or taken out unseen.{' '}
        {lastNight}
      </p>
      <FormMessage state={state} />
      <SubmitButton tone="plain" small>
        Verify the record now
      </SubmitButton>
    </form>
  );
}
