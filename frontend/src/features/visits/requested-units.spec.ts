import { describe, expect, it } from 'vitest';
import { unitsToAsk, withUnitToggled } from './requested-units';
import { lotOf } from './testing/visits.sample';

type Stage = ReturnType<typeof lotOf>['stages'][number];

function duplex(states: readonly Stage['units'][number]['state'][]): ReturnType<typeof lotOf> {
  const lot = lotOf(18);
  const units = states.map((state, index) => ({ unitNumber: index + 1, state }));
  return {
    ...lot,
    units: states.map((_, index) => ({ number: index + 1, label: `Unit ${'AB'[index]}`, geometry: null })),
    stages: lot.stages.map((stage) => ({ ...stage, units })),
  };
}

// The server asks for all units that have not passed where none is named: definitions.md, one open visit per lot, unit set and stage.
describe('the units of a request', () => {
  it('are all that have not passed, until others are chosen', () => {
    const chosen = unitsToAsk(duplex(['put-back-due', 'not-tested']), 'rough-in', {}).map((unit) => unit.isChosen);
    expect(chosen).toEqual([false, true]);
  });

  it('are taken out and in again one by one, per stage', () => {
    const lot = duplex(['not-tested', 'under-test']);
    const without = withUnitToggled({}, lot, 'rough-in', 1);
    expect(unitsToAsk(lot, 'rough-in', without).map(({ isChosen }) => isChosen)).toEqual([false, true]);
    expect(unitsToAsk(lot, 'final', without).map(({ isChosen }) => isChosen)).toEqual([true, true]);
    const again = withUnitToggled(without, lot, 'rough-in', 1);
    expect(unitsToAsk(lot, 'rough-in', again).map(({ isChosen }) => isChosen)).toEqual([true, true]);
  });

  it('never hold one that passed meanwhile, though it was chosen', () => {
    const choices = withUnitToggled({}, duplex(['not-tested', 'not-tested']), 'rough-in', 2);
    const later = unitsToAsk(duplex(['clear', 'not-tested']), 'rough-in', choices);
    expect(later.map(({ isChosen }) => isChosen)).toEqual([false, false]);
  });

  it('are nothing to choose on a lot of one', () => {
    expect(unitsToAsk(lotOf(18), 'rough-in', {})).toEqual([]);
  });
});
