import { appendFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it, vi } from 'vitest';
import { stop, useCheckout } from './checkout-fixture.js';
import { listProcessesOf, readAddresses } from './command-run.js';

const checkout = useCheckout();

describe('npm run dev', () => {
  it('serves page and server apart, restarts the server on a change, and ends all of it', async () => {
    const command = checkout.run('dev.mjs');
    await command.until(/watches your changes/);
    const { web, api } = readAddresses(checkout.folder);
    expect({ web, api }).toEqual({ web: `http://127.0.0.1:${checkout.port}`, api: `${web}/api` });
    const { role, environment } = await checkout.ask();
    expect(role).toBe('holdwater_app');
    expect(environment).not.toHaveProperty('STATIC_DIR'); // vite serves the page, built or not
    expect(environment['PORT']).not.toBe(String(checkout.port));
    appendFileSync(path.join(checkout.folder, 'backend/dist/main.js'), `process.stdout.write('changed\\n');`);
    await vi.waitFor(() => expect(command.output()).toMatch(/^server +\| changed$/m), { timeout: 60_000 });
    expect(await stop(command)).toBe(0);
    expect(listProcessesOf(checkout.folder)).toEqual([]);
  });
});
