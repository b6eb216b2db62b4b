import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';

/** A unit of a lot of several, as a request may ask for it. */
export interface UnitToAsk {
  readonly number: number;
  readonly label: string;
  readonly hasPassed: boolean;
  readonly isChosen: boolean;
}

/** What was chosen on this page, by lot and stage; a lot that is not in it is asked for with all units that have not passed. */
export type UnitChoices = Readonly<Record<string, readonly number[]>>;

type UnitsOfLot = Pick<LotDetail, 'id' | 'units' | 'stages'>;

const keyOf = (lotId: string, stageCode: string): string => `${lotId} ${stageCode}`;

/** The units of a lot of several, in their order; none for a lot of one, where there is nothing to choose. */
export function unitsToAsk(lot: UnitsOfLot, stageCode: string, choices: UnitChoices): UnitToAsk[] {
  if (lot.units.length < 2) return [];
  const states = lot.stages.find(({ code }) => code === stageCode)?.units ?? [];
  const chosen = choices[keyOf(lot.id, stageCode)];
  return [...lot.units]
    .sort((a, b) => a.number - b.number)
    .map(({ number, label }) => {
      const state = states.find(({ unitNumber }) => unitNumber === number)?.state;
      const hasPassed = state === 'clear' || state === 'put-back-due';
      return { number, label, hasPassed, isChosen: !hasPassed && (chosen?.includes(number) ?? true) };
    });
}

/** The choices after a unit is taken in or out. */
export function withUnitToggled(
  choices: UnitChoices,
  lot: UnitsOfLot,
  stageCode: string,
  unitNumber: number,
): UnitChoices {
  const chosen = unitsToAsk(lot, stageCode, choices)
    .filter(({ number, isChosen }) => (number === unitNumber ? !isChosen : isChosen))
    .map(({ number }) => number);
  return { ...choices, [keyOf(lot.id, stageCode)]: chosen };
}
