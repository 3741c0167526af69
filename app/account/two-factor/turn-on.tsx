'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import { begin, confirm, type TwoFactorState } from './actions';

/** A secret for the device, a first code of it, and then the recovery codes. */
export function TurnOn() {
  const [begun, start] = useActionState<TwoFactorState>(begin, untouched);
  const [state, send] = useActionState<TwoFactorState, FormData>(confirm, untouched);
  if (state.codes) return <RecoveryCodes codes={state.codes} />;
  if (!begun.begun)
    return (
      <form action={start}>
        <FormMessage state={begun} />
        <SubmitButton>Turn the second factor on</SubmitButton>
      </form>
    );
  const { secret, address } = begun.begun;
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
        <li>Type the code that it shows now.</li>
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

function RecoveryCodes({ codes }: { codes: string[] }) {
  return (
    <div className="max-w-[676px]" role="status">
      <p className="message done">
        The second factor is on. You were signed out on every other machine. Keep these recovery codes away
        from your device: each signs you in once, and they are not shown again.
      </p>
      <ul className="plainlist">
        {codes.map((code) => (
          <li key={code}>
            <code>{code}</code>
          </li>
        ))}
      </ul>
    </div>
  );
}
