import { QueryClientProvider } from '@tanstack/react-query';
import { act, renderHook, waitFor } from '@testing-library/react';
import type { ReactNode } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { ApiError } from './api-error';
import { useIdempotentMutation } from './idempotent-mutation';
import { createQueryClient } from './query-client';

type Outcome = 'done' | 'offline' | 'refused';

function setUp(outcomes: Outcome[]) {
  const queryClient = createQueryClient();
  const invalidate = vi.spyOn(queryClient, 'invalidateQueries');
  const keys: (string | undefined)[] = [];
  const wrapper = ({ children }: { children: ReactNode }): ReactNode => (
    <QueryClientProvider client={queryClient}>{children}</QueryClientProvider>
  );
  const { result } = renderHook(
    () =>
      useIdempotentMutation({
        mutationFn: async (input: string, { idempotencyKey }) => {
          keys.push(idempotencyKey);
          const outcome = outcomes.shift();
          if (outcome === 'offline') throw new ApiError('offline', { status: 0 });
          if (outcome === 'refused') throw new ApiError('stale-state', { status: 409 });
          return Promise.resolve(input);
        },
        invalidates: (answer) => [['shown', answer]],
      }),
    { wrapper },
  );
  const press = async (input: string): Promise<void> => {
    await act(async () => {
      await result.current.mutateAsync(input).catch(() => undefined);
    });
    await waitFor(() => expect(result.current.isPending).toBe(false));
  };
  return { press, keys, invalidate };
}

describe('the key of an intent', () => {
  it('is kept while it is not known whether the work was done, and new after it was', async () => {
    const { press, keys } = setUp(['offline', 'offline', 'done', 'done']);
    for (let time = 0; time < 4; time += 1) await press('book lot 17');
    expect(keys[1]).toBe(keys[0]);
    expect(keys[2]).toBe(keys[0]);
    expect(keys[3]).not.toBe(keys[0]);
  });

  it('is new for other input', async () => {
    const { press, keys } = setUp(['offline', 'done']);
    await press('book lot 17');
    await press('book lot 18');
    expect(keys[1]).not.toBe(keys[0]);
  });

  it('is new after a plain refusal: the server would only say it again', async () => {
    const { press, keys } = setUp(['refused', 'done']);
    await press('book lot 17');
    await press('book lot 17');
    expect(keys[1]).not.toBe(keys[0]);
  });
});

it('reads anew what the answer has changed, and nothing after a refusal', async () => {
  const { press, invalidate } = setUp(['refused', 'done']);
  await press('lot 17');
  expect(invalidate).not.toHaveBeenCalled();
  await press('lot 17');
  expect(invalidate).toHaveBeenCalledWith({ queryKey: ['shown', 'lot 17'] });
});
