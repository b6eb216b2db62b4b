import { describe, expect, it } from 'vitest';
import { odderly, personOf, tallowmere } from '../lib/testing/people';
import { chosenOf, keepChosen, keptChoice, operatorsFrame } from './chosen-organization';

const both = personOf({
  memberships: [
    { organization: odderly, roles: ['superintendent'] },
    { organization: tallowmere, roles: ['desk'] },
  ],
});

describe('the chosen organization', () => {
  it('is the one kept on this device, for each person', () => {
    keepChosen(both.id, tallowmere.id);
    expect(chosenOf(both, keptChoice(both.id)).chosen?.organization.id).toBe(tallowmere.id);
    expect(keptChoice('somebody else')).toBeNull();
  });

  it('falls back to the first when the kept one is no longer theirs', () => {
    expect(chosenOf(both, 'gone').chosen?.organization.id).toBe(odderly.id);
  });

  it('is none for an operator of no organization, and for one who chose the installation', () => {
    const operator = personOf({ isOperator: true, memberships: [] });
    expect(chosenOf(operator, null)).toEqual({ chosen: null, isOperatorFrame: true });
    expect(chosenOf({ ...both, isOperator: true }, operatorsFrame).isOperatorFrame).toBe(true);
  });

  it('is never the installation for somebody who is no operator', () => {
    expect(chosenOf(both, operatorsFrame)).toMatchObject({ isOperatorFrame: false, chosen: { organization: odderly } });
    expect(chosenOf(personOf({ memberships: [] }), operatorsFrame)).toEqual({ chosen: null, isOperatorFrame: false });
  });
});
