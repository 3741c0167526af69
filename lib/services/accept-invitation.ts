// server only
import { choosePassword } from './choose-password';
import type { Result } from './result';

/** Sets the first password of a person who was invited. */
export function acceptInvitation(raw: unknown): Promise<Result<null>> {
  return choosePassword(raw, 'invitation');
}
