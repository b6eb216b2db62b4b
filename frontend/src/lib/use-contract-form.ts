import { useCallback, useState } from 'react';
import type { z } from 'zod';
import { isApiError } from './api-error';
import { useFieldWords } from './errors';

export interface ContractForm<Values extends Record<string, unknown>> {
  readonly values: Values;
  readonly set: <Name extends keyof Values & string>(name: Name, value: Values[Name]) => void;
  readonly reset: (values?: Values) => void;
  /** The words of what is wrong at a path of the input (`roles`, `access.gateCode`). */
  readonly faultOf: (path: string) => string | undefined;
  /** Whether the contract takes the input; marks the fields where it does not. */
  readonly check: (input: unknown) => boolean;
  /** Marks the fields a refusal names. */
  readonly takeError: (error: unknown) => void;
}

type Faults = Readonly<Record<string, string>>;

/**
 * The values of a form with what is wrong beside each: the contract's own rules before sending, the server's word after. Typing in a field
 * takes its mark away.
 */
export function useContractForm<Values extends Record<string, unknown>>(
  schema: z.ZodType,
  initial: Values,
): ContractForm<Values> {
  const [values, setValues] = useState(initial);
  const [faults, setFaults] = useState<Faults>({});
  const words = useFieldWords();
  const set = useCallback(<Name extends keyof Values & string>(name: Name, value: Values[Name]) => {
    setValues((before) => ({ ...before, [name]: value }));
    setFaults((before) => without(before, name));
  }, []);
  return {
    values,
    set,
    reset: (next = initial) => {
      setValues(next);
      setFaults({});
    },
    faultOf: (path) => words(faults[path]),
    check: (input) => {
      const parsed = schema.safeParse(input);
      setFaults(parsed.success ? {} : faultsOf(parsed.error.issues));
      return parsed.success;
    },
    takeError: (error) => {
      if (isApiError(error)) setFaults(error.fields);
    },
  };
}

/** Every fault under `name` goes: `access` also takes `access.gateCode`. */
function without(faults: Faults, name: string): Faults {
  return Object.fromEntries(Object.entries(faults).filter(([path]) => path !== name && !path.startsWith(`${name}.`)));
}

function faultsOf(
  issues: readonly { path: readonly PropertyKey[]; message: string; code?: string; format?: unknown }[],
): Faults {
  const named = issues.map((issue): [string, string] => [issue.path.join('.'), codeOf(issue)]);
  // The first fault of a field is the one to mend first.
  return Object.fromEntries(named.reverse());
}

/** Contracts name their own faults; of the library's only the email's is worth a word of its own. */
function codeOf(issue: { message: string; format?: unknown }): string {
  return issue.format === 'email' ? 'not-an-email' : issue.message;
}
