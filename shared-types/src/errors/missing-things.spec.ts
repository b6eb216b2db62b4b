import { describe, expect, it } from 'vitest';
import { missingThingOf } from './missing-things.js';

describe('what a 404 names', () => {
  it.each([
    ['/api/lots/:lotId', 'lot'],
    ['/api/lots/:lotId/holds', 'lot'],
    ['/api/lots/:lotId/units/:unitNumber/geometry', 'lot'],
    ['/api/holds/:holdId/readings', 'test'],
    ['/api/organizations/:organizationId/invitations/:invitationId', 'invitation'],
    ['/api/visits', 'lot'],
    ['/api/notices', null],
    ['/api/lots/:strangeId', null],
  ])('%s: %s', (path, thing) => {
    expect(missingThingOf(path)).toBe(thing);
  });
});
