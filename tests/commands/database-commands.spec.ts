import { describe, expect, it } from 'vitest';
import { stop, useCheckout } from './checkout-fixture.js';

const checkout = useCheckout();

describe('npm run demo:reset', () => {
  it('makes the demo anew under a running system, and by itself', async () => {
    const command = await checkout.startReady();
    const before = await checkout.ask();
    expect(await checkout.run('demo-reset.mjs').ended).toBe(0);
    const after = await checkout.ask();
    expect(after.id).not.toBe(before.id);
    await stop(command);
    expect(await checkout.run('demo-reset.mjs').ended).toBe(0);
    await checkout.startReady();
    expect((await checkout.ask()).id).not.toBe(after.id);
  });

  it('refuses in production', async () => {
    const command = checkout.run('demo-reset.mjs', { NODE_ENV: 'production' });
    expect(await command.ended).toBe(1);
    expect(command.output()).toContain('empties a database');
  });
});

describe('npm run db:migrate', () => {
  it('migrates the local database, and asks for the second address when only one is given', async () => {
    expect(await checkout.run('migrate.mjs', { DATABASE_URL: '', DATABASE_MIGRATION_URL: '' }).ended).toBe(0);
    const half = checkout.run('migrate.mjs', { DATABASE_URL: 'postgres://a@127.0.0.1/b', DATABASE_MIGRATION_URL: '' });
    expect(await half.ended).toBe(1);
    expect(half.output()).toContain('DATABASE_MIGRATION_URL is not set');
  });
});
