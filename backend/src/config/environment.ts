import { z } from 'zod';

const url = z.string().refine((value) => URL.canParse(value), 'is not an address');

/**
 * One schema of the environment. Nothing secret has a default: what is missing is told all at once, by name, and the process does not start.
 */
export const environmentSchema = z.object({
  NODE_ENV: z.enum(['production', 'development', 'test']).default('development'),
  HOLDWATER_MODE: z.enum(['demo', 'production']).default('production'),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65_535),
  /** Address people open in the browser; links in mails begin with it. */
  APP_URL: url,
  /** The application's database role. */
  DATABASE_URL: url,
  /** The role that owns the schema; needed only where this process migrates. */
  DATABASE_MIGRATION_URL: url.optional(),
  JWT_SECRET: z.string().min(32, 'needs 32 characters or more'),
  SMTP_URL: url,
  MAIL_FROM: z.email(),
  ROLE: z.enum(['web', 'worker', 'all']).default('all'),
  /** Folder of the built page; without it the API alone is served. */
  STATIC_DIR: z.string().optional(),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  /** How many proxies stand in front; the client's address is read past them. */
  TRUSTED_PROXIES: z.coerce.number().int().min(0).max(10).default(0),
});

export type Environment = z.infer<typeof environmentSchema>;

/** Thrown with every fault of the environment in one message. */
export class EnvironmentError extends Error {}

/** Reads the environment; throws `EnvironmentError` naming every variable that is missing or wrong. */
export function readEnvironment(variables: Record<string, string | undefined>): Environment {
  const given = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== ''));
  const parsed = environmentSchema.safeParse(given);
  const faults = parsed.success
    ? []
    : parsed.error.issues.map((issue) => faultOf(String(issue.path[0]), issue.message, given));
  if (parsed.success) faults.push(...modeFaults(parsed.data));
  if (faults.length > 0) {
    throw new EnvironmentError(
      `Holdwater did not start. Nothing was changed. Set these in the environment and start it again:\n${faults.map((fault) => `  ${fault}`).join('\n')}`,
    );
  }
  return parsed.data as Environment;
}

function faultOf(name: string, message: string, given: Record<string, string | undefined>): string {
  return given[name] === undefined ? `${name} is missing` : `${name} ${message}`;
}

function modeFaults(environment: Environment): string[] {
  return environment.HOLDWATER_MODE === 'demo' ? demoFaults(environment) : productionFaults(environment);
}

/** Everybody knows the passwords of the demo. */
function demoFaults({ HOST }: Environment): string[] {
  return isLoopback(HOST) ? [] : ['HOST must be 127.0.0.1 where HOLDWATER_MODE is demo: its passwords are public'];
}

function productionFaults({ APP_URL, DATABASE_URL, DATABASE_MIGRATION_URL }: Environment): string[] {
  const faults: string[] = [];
  const { protocol, hostname } = new URL(APP_URL);
  if (protocol !== 'https:' && !isLoopback(hostname))
    faults.push('APP_URL must begin with https: in production: sign-ins would be readable on the way');
  const isOneRole =
    DATABASE_MIGRATION_URL !== undefined && new URL(DATABASE_URL).username === new URL(DATABASE_MIGRATION_URL).username;
  if (isOneRole)
    faults.push('DATABASE_URL must use another role than DATABASE_MIGRATION_URL: the server may not own the ledger');
  return faults;
}

function isLoopback(host: string): boolean {
  return host === 'localhost' || host === '[::1]' || host === '::1' || /^127(\.\d{1,3}){3}$/.test(host);
}
