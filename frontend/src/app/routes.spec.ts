import { matchRoutes } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { routes } from './routes';
import { sheetsFor } from './sheets';

const pathOf = (address: string): string | undefined => matchRoutes(routes, address)?.at(-1)?.route.path;

describe('addresses', () => {
  it('have a page behind every sheet', () => {
    const roles = ['superintendent', 'plumber', 'helper', 'inspector', 'desk', 'owner'] as const;
    const sheets = [
      ...sheetsFor({ roles, isOperatorFrame: false }),
      ...sheetsFor({ roles: [], isOperatorFrame: true }),
    ];
    for (const { path } of sheets) expect(pathOf(path)).toBe(path);
  });

  it('take the exact page before the one with a parameter', () => {
    expect(pathOf('/lots/new')).toBe('/lots/new');
    expect(pathOf('/lots/import')).toBe('/lots/import');
    expect(pathOf('/lots/4b')).toBe('/lots/:lotId');
  });

  it('that lead nowhere end on the page that says so', () => expect(pathOf('/no/such/page')).toBe('*'));
});
