import { readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { findAddresses, formatSignIns, removeAddresses, writeAddresses } from '../../backend/scripts/lib/addresses.mjs';
import { makeTemporaryFolder } from './temporary-folder.js';

const ana = { email: 'ana@example.test', password: 'one', role: 'superintendent', organization: 'Cedar Row Homes' };
const ben = { email: 'ben@example.test', password: 'one', role: 'plumber', organization: 'Pike Plumbing' };
const running = {
  web: 'http://127.0.0.1:4310',
  mailbox: 'http://127.0.0.1:4311',
  database: 'postgres://a:b@127.0.0.1:1/c',
};

describe('addresses', () => {
  it('are written in the agreed shape, for their owner only', () => {
    const file = path.join(makeTemporaryFolder(), 'addresses.json');
    writeAddresses({ ...running, demo: [ana] }, file);
    const written: unknown = JSON.parse(readFileSync(file, 'utf8'));
    expect(written).toEqual({ ...running, api: 'http://127.0.0.1:4310/api', demo: [ana] });
    expect(statSync(file).mode & 0o777).toBe(0o600); // mode 0600: the job's description, item 1
  });

  it('stay closed to others when the file was there before with a wider mode', () => {
    const file = path.join(makeTemporaryFolder(), 'addresses.json');
    writeFileSync(file, '{}', { mode: 0o644 });
    writeAddresses({ ...running, demo: [] }, file);
    expect(statSync(file).mode & 0o777).toBe(0o600);
  });

  it('are absent when there is no file, when it is cut off, and after they were removed', () => {
    const file = path.join(makeTemporaryFolder(), 'addresses.json');
    expect(findAddresses(file)).toBeNull();
    writeFileSync(file, '{ "web": ');
    expect(findAddresses(file)).toBeNull();
    writeAddresses({ ...running, demo: [] }, file);
    removeAddresses(file);
    removeAddresses(file);
    expect(findAddresses(file)).toBeNull();
  });
});

describe('formatSignIns', () => {
  it('shows a shared password once', () => {
    const text = formatSignIns([ana, ben]).join('\n');
    expect(text.match(/\bone\b/g)).toHaveLength(1);
    expect(text).toMatch(/superintendent +ana@example\.test/);
    expect(text).toMatch(/plumber +ben@example\.test/);
  });

  it('shows each password beside its person when they differ', () => {
    const text = formatSignIns([ana, { ...ben, password: 'two' }]).join('\n');
    expect(text).toMatch(/ana@example\.test.* one$/m);
    expect(text).toMatch(/ben@example\.test.* two$/m);
  });
});
