import type { Role } from '@/lib/services/actor';
import { type FormState, messageAt, untouched } from '../components/form-state';
import { roleWords } from './role-words';

/** The roles a person has in the office, each to be ticked. */
export function RolePicks({ state, initial = [] }: { state: FormState; initial?: Role[] }) {
  const error = messageAt(state, 'roles');
  const sent = state !== untouched && state.done === undefined;
  const picked: string[] = sent ? (state.typed.roles ?? []) : initial;
  return (
    <fieldset className="fld whole">
      <legend>Roles</legend>
      <div className="picks" key={picked.join()}>
        {(Object.keys(roleWords) as Role[]).map((role) => (
          <label key={role}>
            <input type="checkbox" name="roles" value={role} defaultChecked={picked.includes(role)} />
            {roleWords[role]}
          </label>
        ))}
      </div>
      {error ? <p className="ans e">{error}</p> : null}
    </fieldset>
  );
}
