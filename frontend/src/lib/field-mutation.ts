import { useRef } from 'react';
import type { UseMutationResult } from '@tanstack/react-query';
import type { CallOptions } from './api';
import { isApiError } from './api-error';
import { useIdempotentMutation, type IdempotentMutation } from './idempotent-mutation';

/** What every entry made in the field carries: its own id and when it was made by the clock of this device. */
export interface FieldEntry {
  readonly clientId: string;
  readonly madeAt: string;
  /** The id of one part of the entry, such as a reading inside it; the same name gives the same id. */
  readonly idOf: (part: string) => string;
}

interface Kept extends FieldEntry {
  readonly about: string;
}

export interface FieldMutation<Input, Answer> extends Omit<IdempotentMutation<Input, Answer>, 'mutationFn'> {
  readonly mutationFn: (input: Input, entry: FieldEntry, options: CallOptions) => Promise<Answer>;
}

function newEntry(about: string): Kept {
  const ids = new Map<string, string>();
  const idOf = (part: string): string => {
    const id = ids.get(part) ?? crypto.randomUUID();
    ids.set(part, id);
    return id;
  };
  return { about, clientId: crypto.randomUUID(), madeAt: new Date().toISOString(), idOf };
}

/**
 * A write of something that happened in the field. Pressing again after a lost answer sends the same entry with its first time, so it is
 * never entered twice; a success or a plain refusal ends it.
 */
export function useFieldMutation<Input, Answer>(
  options: FieldMutation<Input, Answer>,
): UseMutationResult<Answer, unknown, Input> {
  const kept = useRef<Kept | null>(null);
  return useIdempotentMutation<Input, Answer>({
    ...options,
    mutationFn: (input, callOptions) => {
      const about = JSON.stringify(input) ?? '';
      if (kept.current?.about !== about) kept.current = newEntry(about);
      return options.mutationFn(input, kept.current, callOptions);
    },
    onDone: (answer, input) => {
      kept.current = null;
      options.onDone?.(answer, input);
    },
    onFail: (error, input) => {
      if (!isApiError(error) || !error.isUndecided) kept.current = null;
      options.onFail?.(error, input);
    },
  });
}
