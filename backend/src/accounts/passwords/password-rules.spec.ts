import { describe, expect, it } from 'vitest';
import { AppError } from '../../common/errors/app-error.js';
import { assertPassword } from './password-rules.js';

const email = 'ruben.achterberg@example.test';

function refusalOf(password: string | undefined): AppError | null {
  try {
    assertPassword(password, email);
    return null;
  } catch (error) {
    if (error instanceof AppError) return error;
    throw error;
  }
}

describe('what may be a password', () => {
  // OWASP ASVS 5.0 6.2.1 (8 at least), 6.2.5 (no composition), 6.2.9 (64 and more)
  it.each(['eight ch', 'zzzqqqvv', 'x'.repeat(60) + 'yzab', 'ñandú bajo la lluvia', '        a'])(
    'takes %j',
    (password) => {
      expect(refusalOf(password)).toBeNull();
    },
  );

  it.each([
    [undefined, 'required'],
    ['', 'required'],
    ['seven c', 'password-short'],
    ['ab'.repeat(129), 'too-long'],
  ])('refuses %j', (password, why) => {
    expect(refusalOf(password)).toMatchObject({ code: 'bad-input', fields: { password: why } });
  });

  // commonest of the yearly lists, from memory; 6.2.4 asks that the commonest be refused
  it.each([
    'password',
    'Password123',
    'QWERTYUIOP',
    '12345678',
    '87654321',
    '1234567890',
    'iloveyou',
    'aaaaaaaa',
    'abababab',
    'sunshine',
  ])('refuses the common %s', (password) => {
    expect(refusalOf(password)).toMatchObject({ code: 'password-common' });
  });

  // OWASP ASVS 5.0 6.2.11: words of this place
  it.each(['holdwater', 'Holdwater1', 'plumber2027', email, 'Ruben.Achterberg'])(
    'refuses %s, which this place suggests',
    (password) => {
      expect(refusalOf(password)).toMatchObject({ code: 'password-common' });
    },
  );
});
