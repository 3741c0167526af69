import type { FormState } from './form-state';

/** What holds for the whole form: the refusal that belongs to no field, or what was done. */
export function FormMessage({ state }: { state: FormState }) {
  const whole = state.errors.filter((e) => e.path === '');
  return (
    <div aria-live="polite">
      {whole.map((e) => (
        <p key={e.message} className="message e">
          {e.message}
        </p>
      ))}
      {state.errors.length === 0 && state.done ? <p className="message done">{state.done}</p> : null}
    </div>
  );
}
