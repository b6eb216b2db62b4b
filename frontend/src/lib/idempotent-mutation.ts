import { useMutation, useQueryClient, type QueryKey, type UseMutationResult } from '@tanstack/react-query';
import { useRef } from 'react';
import { isApiError } from './api-error';
import type { CallOptions } from './api';

export interface IdempotentMutation<Input, Answer> {
  /** The write; hand `options` on to `call`. */
  readonly mutationFn: (input: Input, options: CallOptions) => Promise<Answer>;
  /** The queries that show what has changed. The act counts as done when they are read anew. */
  readonly invalidates?: (answer: Answer, input: Input) => readonly QueryKey[];
  readonly onDone?: (answer: Answer, input: Input) => void;
  readonly onFail?: (error: unknown, input: Input) => void;
}

interface Intent {
  readonly key: string;
  readonly about: string;
}

/**
 * A write with one idempotency key per intent: pressing again after a lost answer sends the same key, so the server does it once. Other
 * input, a success or a plain refusal ends the intent.
 */
export function useIdempotentMutation<Input, Answer>(
  options: IdempotentMutation<Input, Answer>,
): UseMutationResult<Answer, unknown, Input> {
  const queryClient = useQueryClient();
  const intent = useRef<Intent | null>(null);
  return useMutation<Answer, unknown, Input>({
    mutationFn: (input) => {
      const about = JSON.stringify(input) ?? '';
      if (intent.current?.about !== about) intent.current = { key: crypto.randomUUID(), about };
      return options.mutationFn(input, { idempotencyKey: intent.current.key });
    },
    onSuccess: async (answer, input) => {
      intent.current = null;
      options.onDone?.(answer, input);
      const stale = options.invalidates?.(answer, input) ?? [];
      await Promise.all(stale.map((queryKey) => queryClient.invalidateQueries({ queryKey })));
    },
    onError: (error, input) => {
      if (!isApiError(error) || !error.isUndecided) intent.current = null;
      options.onFail?.(error, input);
    },
  });
}
