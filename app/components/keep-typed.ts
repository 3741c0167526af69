import { type FormEvent, startTransition } from 'react';

/** Sends a form without the reset that follows a form's action, so that fields kept by the page keep their words. */
export function keepTyped(send: (form: FormData) => void) {
  return (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    startTransition(() => send(form));
  };
}
