import { sqlFaultOf } from '../errors/error-body.js';

/**
 * What is logged of an error: what it is, where it was thrown, and of the database which rule it met. Never its statement and values, nor
 * the body that could not be read: they are people's words, addresses, hashes of secrets.
 */
export function errorForLog(given: unknown): Record<string, unknown> {
  // pino-http serializes an error itself first, and keeps the error beside
  const error = typeof given === 'object' && given !== null && 'raw' in given ? given.raw : given;
  if (!(error instanceof Error)) return { type: typeof error, message: String(error) };
  const { code, constraint, table } = sqlFaultOf(error);
  return { type: error.name, message: error.message, stack: error.stack, code, constraint, table };
}
