import type { z } from 'zod';

type RawIssue = Parameters<z.core.$ZodErrorMap>[0];

const typeCodes: Readonly<Record<string, string>> = {
  number: 'must-be-a-number',
  int: 'must-be-a-whole-number',
  string: 'must-be-text',
  boolean: 'must-be-yes-or-no',
  array: 'must-be-a-list',
  tuple: 'must-be-a-list',
  object: 'must-be-an-object',
  record: 'must-be-an-object',
};

const formatCodes: Readonly<Record<string, string>> = {
  email: 'not-an-email',
  date: 'must-be-an-instant',
  datetime: 'must-be-an-instant',
  uuid: 'unknown',
};

/** What is wrong with a value, as a code that has words in both languages; for whatever a contract gives no code of its own. */
export function codeOfIssue(issue: RawIssue): string {
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined ? 'required' : (typeCodes[issue.expected] ?? 'wrong');
    case 'too_small':
      return smallCodeOf(issue.origin, issue.input);
    case 'too_big':
      return bigCodeOf(issue.origin);
    case 'invalid_format':
      return formatCodes[issue.format] ?? 'wrong';
    case 'invalid_value':
    case 'invalid_union':
      return issue.input === undefined ? 'required' : 'not-one-of-the-choices';
    case 'unrecognized_keys':
      return 'unknown';
    default:
      return 'wrong';
  }
}

function smallCodeOf(origin: string, input: unknown): string {
  if (origin === 'string') return input === '' ? 'required' : 'wrong';
  return origin === 'array' ? 'required' : 'out-of-range';
}

function bigCodeOf(origin: string): string {
  if (origin === 'string') return 'too-long';
  return origin === 'array' ? 'too-many' : 'out-of-range';
}
