import { renderHook } from '@testing-library/react';
import i18next from 'i18next';
import { afterEach, describe, expect, it } from 'vitest';
import { ApiError } from './api-error';
import { errorParams, useErrorWords, useFieldWords } from './errors';

const wordsOf = (error: unknown) => renderHook(() => useErrorWords(error)).result.current;

afterEach(async () => {
  await i18next.changeLanguage('en');
});

describe('the words of an error', () => {
  it('count the tries that are left', () => {
    const words = (triesLeft: number) =>
      wordsOf(new ApiError('sign-in-failed', { status: 401, params: { triesLeft } }));
    // interface.md, section 5, Sign in.
    expect(`${words(4)?.title ?? ''}. ${words(4)?.safe ?? ''}`).toBe('Email or password do not match. 4 tries left.');
    expect(words(1)?.safe).toBe('1 try left.');
  });

  it('say how long to wait', () => {
    const error = new ApiError('sign-in-throttled', { status: 429, params: { retryAfterSeconds: 61 } });
    expect(wordsOf(error)?.next).toContain('2 min');
  });

  it('say what it is now, and which days are open', () => {
    const stale = wordsOf(new ApiError('stale-state', { status: 409, params: { is: 'ready', version: 4 } }));
    expect(stale?.safe).toContain('It is now: test up.');
    // A state nobody has words for is left out, not printed as code.
    const odd = wordsOf(new ApiError('stale-state', { status: 409, params: { is: 'some-code' } }));
    expect(odd?.safe).toBe('Nothing of yours was saved over it.');
    const late = wordsOf(new ApiError('cut-off-passed', { status: 409, params: { firstDate: '2026-04-16' } }));
    expect(late?.next).toContain('Thu, Apr 16');
  });

  it('name the thing that is not there for this reader, and stay general where the server names none', () => {
    const words = (params: Record<string, unknown>) =>
      wordsOf(new ApiError('not-found', { status: 404, params }))?.title;
    expect(words({ what: 'lot' })).toBe('No such lot for you');
    expect(words({ what: 'rule-card' })).toBe('No such rule card for you');
    expect(words({})).toBe('No such page or entry for you');
  });

  it('are Spanish to a Spanish reader', async () => {
    await i18next.changeLanguage('es');
    expect(wordsOf(new ApiError('offline', { status: 0 }))?.title).toBe('Sin señal');
  });

  it('stand for anything that was thrown, and for nothing when nothing was', () => {
    expect(wordsOf(new Error('secret of the code'))?.code).toBe('unknown');
    expect(wordsOf(new Error('secret of the code'))?.title).not.toContain('secret');
    expect(wordsOf(null)).toBeNull();
  });
});

it('writes the times an error names in the zone it names', () => {
  const params = { cutoffAt: '2026-04-14T21:00:00Z', date: '2026-04-16', zone: 'America/Denver', count: 3 };
  expect(errorParams(params, 'en')).toMatchObject({ cutoffAt: 'Tue, Apr 14, 3:00 pm', date: 'Thu, Apr 16', count: 3 });
});

it('has a word for a field fault it does not know', () => {
  const { result } = renderHook(() => useFieldWords());
  expect(result.current('required')).toBe('This is needed.');
  expect(result.current('Invalid input: expected string, received undefined')).toBe('This is not right.');
  expect(result.current(undefined)).toBeUndefined();
});
