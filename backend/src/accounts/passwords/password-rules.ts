import { newPassword } from '@holdwater/shared-types/accounts/auth.contract.js';
import { refuse } from '../../common/errors/app-error.js';
import { isCommonPassword } from './common-passwords.js';

/** Words an attacker of this very installation tries first: ASVS 5.0 6.2.11. */
const ownWords = ['holdwater', 'plumbing', 'plumber', 'inspector', 'builder'];

/**
 * Refuses what may not be a password: too short or too long, among the commonest, or the person's own address, or a word of this place with
 * nothing but digits and signs around it. Nothing is asked of its letters (ASVS 5.0 6.2.5).
 */
export function assertPassword(password: string | undefined, email: string): string {
  const parsed = newPassword.safeParse(password ?? '');
  if (!parsed.success) {
    const why = password === undefined || password === '' ? 'required' : (parsed.error.issues[0]?.message ?? 'wrong');
    return refuse('bad-input', {}, { password: why });
  }
  if (isCommonPassword(parsed.data) || isOwn(parsed.data, email)) refuse('password-common', {}, { password: 'wrong' });
  return parsed.data;
}

function isOwn(password: string, email: string): boolean {
  const lower = password.toLowerCase();
  const bare = lower.replaceAll(/[^\p{L}]/gu, '');
  return ownWords.includes(bare) || lower === email || lower === email.split('@')[0];
}
