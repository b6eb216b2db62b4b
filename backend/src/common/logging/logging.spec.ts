import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { Writable } from 'node:stream';
import { type HttpLogger, pinoHttp, type Options } from 'pino-http';
import { DatabaseError, ValidationError } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readEnvironment } from '../../config/environment.js';
import { loggingParams } from './logging.js';

// ASVS 5.0 16.2.5: no credentials in logs, session tokens at most masked or hashed.
const secrets = {
  bearer: 'eyJhbGciOiJIUzI1NiJ9.bearer.secret',
  cookie: 'refresh-cookie-secret',
  password: 'rain on the roof',
  link: 'link-token-secret',
  query: 'words-of-a-person',
};

const environment = readEnvironment({
  PORT: '0',
  APP_URL: 'http://127.0.0.1:4310',
  DATABASE_URL: 'postgres://app@127.0.0.1/h',
  JWT_SECRET: 'x'.repeat(32),
  SMTP_URL: 'smtp://127.0.0.1:9',
  MAIL_FROM: 'visits@example.test',
  HOLDWATER_MODE: 'demo',
});

describe('the log of a real request', () => {
  let logged = '';
  let url = '';
  const sink = new Writable({
    write(chunk: Buffer, _encoding, done) {
      logged += chunk.toString();
      done();
    },
  });
  const logger: HttpLogger = pinoHttp(loggingParams(environment).pinoHttp as Options, sink);
  const server = createServer((request: IncomingMessage, response: ServerResponse) => {
    logger(request, response);
    request.log.error({ err: databaseError(), token: secrets.link }, 'request failed');
    request.log.warn({ body: { password: secrets.password, token: secrets.link } }, 'a body');
    response.setHeader('Set-Cookie', `holdwater_refresh=${secrets.cookie}`);
    response.statusCode = 500;
    request.resume().on('end', () => response.end('{}'));
  });

  beforeAll(async () => {
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
    await fetch(`${url}/api/auth/sign-in?q=${secrets.query}`, {
      method: 'POST',
      headers: { authorization: `Bearer ${secrets.bearer}`, cookie: `holdwater_refresh=${secrets.cookie}` },
      body: JSON.stringify({ password: secrets.password }),
    });
  });
  afterAll(() => server.close());

  it('names the request and what failed', () => {
    expect(logged).toContain('"path":"/api/auth/sign-in"');
    expect(logged).toContain('"status":500');
    expect(logged).toContain('"constraint":"persons_email_key"');
  });

  it.each(Object.entries(secrets))('holds nothing of the %s', (_name, secret) => {
    expect(logged).not.toContain(secret);
  });
});

/** As Sequelize throws it: with the statement and every value beside it. */
function databaseError(): Error {
  const original = Object.assign(new ValidationError('duplicate key value', []), {
    sql: `UPDATE persons SET password_hash = '${secrets.password}'`,
    parameters: [secrets.link],
    code: '23505',
    constraint: 'persons_email_key',
    detail: `Key (email)=(${secrets.query}) already exists.`,
  });
  return new DatabaseError(original);
}
