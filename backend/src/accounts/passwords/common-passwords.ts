import { dictionary } from '@zxcvbn-ts/language-common';

/** 49,000 of the commonest, in small letters. */
const commonest = new Set(dictionary['passwords-common']);

/** Whether a password is among those tried first, in whatever letters: ASVS 5.0 6.2.4 asks for the 3000 commonest at least. */
export function isCommonPassword(password: string): boolean {
  const lower = password.toLowerCase();
  return commonest.has(lower) || /^(.{1,4})\1+$/.test(lower) || isRun(lower);
}

/** Neighbours throughout, up or down: 12345678, hgfedcba. */
function isRun(text: string): boolean {
  const steps = [...text].slice(1).map((char, n) => char.charCodeAt(0) - text.charCodeAt(n));
  return steps.every((step) => step === 1 || step === -9) || steps.every((step) => step === -1 || step === 9);
}
