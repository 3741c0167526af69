import type { FormState } from '../components/form-state';

/** What the token form shows; the secret of a new token stands there once. */
export interface TokenState extends FormState {
  token?: string;
}
