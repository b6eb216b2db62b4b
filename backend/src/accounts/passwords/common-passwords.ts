/**
 * A short list of our own, of 8 characters and more, from memory of what is published each year as commonest.
 * To be replaced by a kept list of the commonest thousands.
 */
const commonest = new Set([
  ...[
    'password',
    'password1',
    'password12',
    'password123',
    'passw0rd',
    'p@ssw0rd',
    'p@ssword',
    'password!',
    'passwords',
    'mypassword',
  ],
  ...[
    'qwertyui',
    'qwertyuiop',
    'qwerty12',
    'qwerty123',
    'qwerty1234',
    '1q2w3e4r',
    '1q2w3e4r5t',
    '1qaz2wsx',
    'zaq12wsx',
    'qazwsxedc',
  ],
  ...[
    'asdfghjk',
    'asdfghjkl',
    'zxcvbnm1',
    'q1w2e3r4',
    'q1w2e3r4t5',
    'abcd1234',
    'abc12345',
    'abcdefgh',
    'a1b2c3d4',
    'aa123456',
  ],
  ...[
    'iloveyou',
    'iloveyou1',
    'sunshine',
    'princess',
    'football',
    'football1',
    'baseball',
    'baseball1',
    'superman',
    'trustno1',
  ],
  ...[
    'starwars',
    'whatever',
    'computer',
    'internet',
    'michelle',
    'jennifer',
    'jordan23',
    'liverpool',
    'chocolate',
    'butterfly',
  ],
  ...[
    'letmein1',
    'welcome1',
    'welcome123',
    'admin123',
    'administrator',
    'changeme',
    'master123',
    'dragon123',
    'monkey123',
    'shadow123',
  ],
]);

/** Whether a password is among those tried first, in whatever letters: ASVS 5.0 6.2.4. */
export function isCommonPassword(password: string): boolean {
  const lower = password.toLowerCase();
  return commonest.has(lower) || /^(.{1,4})\1+$/.test(lower) || isRun(lower);
}

/** Neighbours throughout, up or down: 12345678, hgfedcba. */
function isRun(text: string): boolean {
  const steps = [...text].slice(1).map((char, n) => char.charCodeAt(0) - text.charCodeAt(n));
  return steps.every((step) => step === 1 || step === -9) || steps.every((step) => step === -1 || step === 9);
}
