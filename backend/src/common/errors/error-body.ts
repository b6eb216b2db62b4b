import { HttpException } from '@nestjs/common';
import type { ErrorBody } from '@holdwater/shared-types/errors/error-body.js';
import { ZodError } from 'zod';
import { AppError } from './app-error.js';

interface DatabaseFault {
  code?: string;
  constraint?: string;
  table?: string;
}

/** Constraints that refuse what a person may honestly run into, and what that is called. */
const constraintCodes = {
  visits_one_open: 'open-visit-exists',
  visits_one_place: 'window-full',
  visits_inspector_once: 'window-full',
  lots_number_in_tract: 'lot-number-taken',
  lots_address_without_tract: 'lot-number-taken',
  holds_one_standing: 'hold-standing',
  rule_cards_one_in_force: 'rule-card-overlap',
  rule_cards_one_draft: 'rule-card-not-draft',
  lot_consents_one_open: 'party-pending',
  invitations_one_open: 'already-member',
} as const;

/** SQLSTATEs that mean: the database is away or overloaded, try again. */
const awayStates = [
  '57P01',
  '57P02',
  '57P03',
  '53300',
  '08000',
  '08003',
  '08006',
  '08001',
  '57014',
  '55P03',
  'ECONNREFUSED',
  'ECONNRESET',
];

/**
 * SQLSTATEs of class 22 that only what a person sent can bring about: a sign the database does not keep (NUL, half a surrogate pair), a
 * number, a day or an id outside of what its column holds.
 */
const badInputStates = ['22021', '22P05', '22P02', '22003', '22007', '22008', '22009'];

/** A client's own id names one entry for ever; two requests that bring it at once meet here. */
const clientIdConstraint = /_client_id_key$/;

/** Turns whatever was thrown into the one error body. `entry` is what a person tells support. */
export function errorBodyOf(error: unknown, entry: string): { status: number; body: ErrorBody } {
  const known = appErrorOf(error);
  return {
    status: known.status,
    body: {
      code: known.code,
      message: known.code === 'bad-input' ? badInputMessage(known.fields) : known.code.replaceAll('-', ' '),
      ...(Object.keys(known.params).length > 0 && { params: known.params }),
      ...(Object.keys(known.fields).length > 0 && { fields: known.fields }),
      entry,
    },
  };
}

function badInputMessage(fields: Record<string, string>): string {
  const named = Object.entries(fields).map(([path, why]) => `${path || 'input'}: ${why}`);
  return named.length > 0 ? `bad input: ${named.join('; ')}` : 'bad input';
}

function appErrorOf(error: unknown): AppError {
  if (error instanceof AppError) return error;
  if (error instanceof ZodError) return new AppError('bad-input', {}, fieldsOf(error));
  if (error instanceof HttpException) return httpErrorOf(error);
  const fault = databaseFaultOf(error);
  if (fault?.constraint !== undefined && fault.constraint in constraintCodes) {
    return new AppError(constraintCodes[fault.constraint as keyof typeof constraintCodes]);
  }
  if (clientIdConstraint.test(fault?.constraint ?? ''))
    return new AppError('bad-input', {}, { clientId: 'used-before' });
  if (fault?.code !== undefined && badInputStates.includes(fault.code)) return new AppError('bad-input');
  if (isAway(error, fault)) return new AppError('busy');
  return unreadOf(error) ?? new AppError('internal');
}

/** Where each fault of an input lies, `plugs.0.ratedPsi`, and what it is. */
export function fieldsOf(error: ZodError): Record<string, string> {
  const fields: Record<string, string> = {};
  for (const issue of error.issues) {
    if (issue.code === 'unrecognized_keys') {
      for (const key of issue.keys) fields[[...issue.path, key].join('.')] ??= 'unknown';
    } else {
      fields[issue.path.join('.')] ??= issue.message;
    }
  }
  return fields;
}

function httpErrorOf(error: HttpException): AppError {
  switch (error.getStatus()) {
    case 400:
    case 415:
      return new AppError('bad-input');
    case 401:
      return new AppError('signed-out');
    case 403:
    case 404:
      return new AppError('not-found');
    case 413:
      return new AppError('too-large');
    default:
      return new AppError('internal');
  }
}

function databaseFaultOf(error: unknown): DatabaseFault | null {
  if (typeof error !== 'object' || error === null) return null;
  const inner = 'original' in error ? error.original : 'parent' in error ? error.parent : error;
  return typeof inner === 'object' && inner !== null ? inner : null;
}

/** The SQLSTATE behind an error of the database, or null. */
export function sqlStateOf(error: unknown): string | null {
  return databaseFaultOf(error)?.code ?? null;
}

/** What the database names of an error: the SQLSTATE, the constraint, the table; empty where it was no error of the database. */
export function sqlFaultOf(error: unknown): DatabaseFault {
  return databaseFaultOf(error) ?? {};
}

function isAway(error: unknown, fault: DatabaseFault | null): boolean {
  const name = error instanceof Error ? error.name : '';
  const isConnection = name.startsWith('SequelizeConnection') || name === 'SequelizeHostNotReachableError';
  const isTerminated =
    error instanceof Error && /Connection terminated|Client has encountered a connection error/.test(error.message);
  return isConnection || isTerminated || (fault?.code !== undefined && awayStates.includes(fault.code));
}

/** What was refused before it reached a route, as a body that cannot be read or a file that is not there; null for anything else. */
function unreadOf(error: unknown): AppError | null {
  const status = typeof error === 'object' && error !== null && 'status' in error ? error.status : null;
  if (status === 413) return new AppError('too-large');
  if (status === 404) return new AppError('not-found');
  return typeof status === 'number' && status >= 400 && status < 500 ? new AppError('bad-input') : null;
}
