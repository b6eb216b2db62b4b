import { describe, expect, it } from 'vitest';
import { Passwords } from './passwords.js';

describe('passwords', () => {
  const passwords = new Passwords();

  // OWASP ASVS 5.0 appendix C.4: argon2id, t = 1, m ≥ 47104 KiB, p = 1. The string is of RFC 9106's reference encoding.
  it('are hashed by argon2id with the cost asked for, salted', async () => {
    const [one, two] = await Promise.all([passwords.hash('rain on the roof'), passwords.hash('rain on the roof')]);
    expect(one).toMatch(/^\$argon2id\$v=19\$m=47104,t=1,p=1\$/);
    expect(one).not.toBe(two);
  });

  it('are right or wrong as they were given, to the letter', async () => {
    const hashed = await passwords.hash('Rain on the roof ');
    expect(await passwords.isRight(hashed, 'Rain on the roof ')).toBe(true);
    expect(await passwords.isRight(hashed, 'rain on the roof ')).toBe(false);
    expect(await passwords.isRight(hashed, 'Rain on the roof')).toBe(false);
  });

  it('are never right where there is none', async () => {
    expect(await passwords.isRight(null, 'a password that nobody has')).toBe(false);
  });
});
