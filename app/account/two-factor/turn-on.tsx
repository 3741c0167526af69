'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import { begin, confirm, type TwoFactorState } from './actions';

/** A secret for the device and the recovery codes, shown once; then a first code of the device. */
export function TurnOn() {
  const [begun, start] = useActionState<TwoFactorState>(begin, untouched);
  const [state, send] = useActionState<TwoFactorState, FormData>(confirm, untouched);
  if (!begun.begun)
    return (
      <form action={start}>
        <FormMessage state={begun} />
        <SubmitButton>Turn the second factor on</SubmitButton>
      </form>
    );
  const { secret, address, codes } = begun.begun;
  return (
    <>
      <ol className="plainlist max-w-[676px] mt-4">
        <li>
          Enter this key in a program for one-time codes on your device (time-based, six figures, thirty
          seconds): <b className="block break-all">{secret.match(/.{4}/g)?.join(' ')}</b>
          <a className="t" href={address}>
            Open it on this device
          </a>
        </li>
        <li>
          Keep these recovery codes away from the device. Each signs you in once; they are not shown again.
          <span className="block">
            {codes.map((code) => (
              <code key={code} className="block">
                {code}
              </code>
            ))}
          </span>
        </li>
        <li>
          Type the code that the device shows now. You stay signed in here and are signed out on every other
          machine.
        </li>
      </ol>
      <form action={send} noValidate className="max-w-[320px] mt-4">
        <FormMessage state={state} />
        <TextField
          name="code"
          label="Code"
          autoComplete="one-time-code"
          state={state}
          maxLength={7}
          required
        />
        <div className="row">
          <SubmitButton>Confirm</SubmitButton>
        </div>
      </form>
    </>
  );
}
