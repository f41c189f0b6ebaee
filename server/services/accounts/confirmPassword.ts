import { ProblemError } from '../../http/ProblemError';
import type { ConsoleServices, Origin } from '../console/ConsoleServices';
import type { SignedIn } from '../sessions/liveSession';

/**
 * Asks for the password once more before something that a stolen session must not do. Guessing is slowed down.
 * @throws ProblemError 403 where it does not fit, 429 while a delay lasts
 */
export async function confirmPassword(
  { hasher, throttle }: ConsoleServices,
  { account }: SignedIn,
  password: string,
  { addressGroup }: Origin,
): Promise<void> {
  const attempt = { name: `again ${account.id}`, addressGroup, isKnownPlace: false };
  await throttle.admit(attempt);
  if (!(await hasher.verify(password, account.passwordHash))) throw new ProblemError('password_wrong');
  await throttle.succeeded(attempt);
}
