import { describe, expect, it } from 'vitest';
import { EnvironmentError, readEnvironment } from './environment.js';

const whole = {
  PORT: '4310',
  APP_URL: 'https://holdwater.example.test',
  DATABASE_URL: 'postgres://app:a@127.0.0.1/h',
  JWT_SECRET: 'x'.repeat(32),
  SMTP_URL: 'smtp://127.0.0.1:25',
  MAIL_FROM: 'visits@example.test',
};

describe('the environment', () => {
  it('takes a whole one', () => {
    expect(readEnvironment(whole).PORT).toBe(4310);
  });

  it('names every missing variable at once, an empty one too', () => {
    expect(() => readEnvironment({ PORT: '4310', JWT_SECRET: '' })).toThrowError(EnvironmentError);
    try {
      readEnvironment({ PORT: '4310', JWT_SECRET: '' });
    } catch (error) {
      for (const name of ['APP_URL', 'DATABASE_URL', 'JWT_SECRET', 'SMTP_URL', 'MAIL_FROM']) {
        expect((error as Error).message).toContain(`${name} is missing`);
      }
    }
  });

  it('refuses a short secret and one role for schema and server', () => {
    expect(() => readEnvironment({ ...whole, JWT_SECRET: 'short' })).toThrowError(/JWT_SECRET needs 32/);
    expect(() => readEnvironment({ ...whole, DATABASE_MIGRATION_URL: whole.DATABASE_URL })).toThrowError(
      /another role/,
    );
  });

  it('refuses production without https, but on the machine itself', () => {
    expect(() => readEnvironment({ ...whole, APP_URL: 'http://holdwater.example.test' })).toThrowError(/https/);
    expect(readEnvironment({ ...whole, APP_URL: 'http://127.0.0.1:4310' }).HOLDWATER_MODE).toBe('production');
  });

  it('refuses a demo that others can reach', () => {
    const demo = { ...whole, HOLDWATER_MODE: 'demo' };
    expect(() => readEnvironment({ ...demo, HOST: '0.0.0.0' })).toThrowError(/passwords are public/);
    expect(readEnvironment(demo).HOST).toBe('127.0.0.1');
  });
});
