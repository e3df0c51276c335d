import { LIMITS } from '@/shared/limits';
import { uiAccount } from '@/shared/text/uiAccount';

/** The rule of a new password, said before the server has to; undefined when it fits. */
export function newPasswordError(typed: string): string | undefined {
  if (typed === '') return uiAccount.signIn.emptyPassword;
  if (typed.length < LIMITS.passwordMin) return uiAccount.tooShort(typed.length);
  return typed.length > LIMITS.passwordMax ? uiAccount.tooLong : undefined;
}
