import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { describe, expect, it } from 'vitest';
import { findSheet, landingsFor, phoneSheetsFor, sheetsFor, type Worker } from './sheets';

const as = (...roles: MemberRole[]): Worker => ({ roles, isOperatorFrame: false });
const operator: Worker = { roles: [], isOperatorFrame: true };

// interface.md, section 4, for the pages there are: without Today and Reports.
describe('the top bar', () => {
  it.each<[string, Worker, string[]]>([
    ['superintendent', as('superintendent'), ['calendar', 'lots', 'corrections', 'ruleCards']],
    ['plumber', as('plumber'), ['calendar', 'lots', 'corrections', 'ruleCards']],
    ['helper', as('helper'), ['calendar', 'lots', 'corrections', 'ruleCards']],
    ['inspector', as('inspector'), ['run', 'calendar', 'lots', 'ruleCards']],
    ['desk', as('desk'), ['dayBoard', 'calendar', 'requests', 'lots', 'ruleCards']],
    ['operator', operator, ['organizations', 'deliveries', 'ledger']],
    ['owner alone', as('owner'), ['ruleCards']],
    [
      'several roles',
      as('desk', 'inspector', 'owner'),
      ['run', 'dayBoard', 'calendar', 'requests', 'lots', 'ruleCards'],
    ],
  ])('of a %s', (_, worker, ids) => expect(sheetsFor(worker).map((sheet) => sheet.id)).toEqual(ids));

  it('never has more sheets than the nine keys', () => {
    const everything = as('superintendent', 'plumber', 'helper', 'inspector', 'desk', 'owner');
    expect(sheetsFor(everything).length).toBeLessThanOrEqual(9);
  });
});

describe('the day starts', () => {
  it.each<[string, Worker, string[]]>([
    ['superintendent', as('superintendent'), ['/calendar']],
    ['helper', as('helper'), ['/calendar']],
    ['inspector', as('inspector'), ['/run']],
    ['desk', as('desk'), ['/day']],
    ['owner alone', as('owner'), ['/people']],
    ['owner with another role', as('plumber', 'owner'), ['/calendar']],
    ['small department', as('desk', 'inspector', 'owner'), ['/run', '/day']],
    ['operator', operator, ['/operations/organizations']],
    ['person of no organization', as(), ['/rule-cards']],
  ])('of a %s', (_, worker, paths) => expect(landingsFor(worker)).toEqual(paths));
});

describe('the phone bar', () => {
  it.each<[string, Worker, string[]]>([
    ['superintendent', as('superintendent'), ['calendar', 'lots', 'corrections']],
    ['inspector', as('inspector'), ['run', 'calendar', 'lots']],
    ['desk', as('desk'), ['dayBoard', 'requests', 'lots']],
  ])('of a %s', (_, worker, ids) => expect(phoneSheetsFor(worker).map((sheet) => sheet.id)).toEqual(ids));
});

it('knows the sheet of a sub-page, and no sheet for a path that only begins alike', () => {
  const sheets = sheetsFor(as('superintendent'));
  expect(findSheet(sheets, '/lots/17/test')?.id).toBe('lots');
  expect(findSheet(sheets, '/lotsofthings')).toBeNull();
  expect(findSheet(sheets, '/notices')).toBeNull();
});
