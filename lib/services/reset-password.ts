// server only
import { choosePassword } from './choose-password';
import type { Result } from './result';

/** Sets a new password by the link that was mailed. */
export function resetPassword(raw: unknown): Promise<Result<null>> {
  return choosePassword(raw, 'password');
}
