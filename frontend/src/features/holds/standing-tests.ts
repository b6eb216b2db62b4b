import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import type { Medium, System } from '@holdwater/shared-types/holds/hold.states.js';
import { openVisitStates } from '@holdwater/shared-types/visits/visit.states.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Instrument } from './typed-reading';

/** One system of one unit: what is tested. */
export interface TestedPart {
  readonly unitNumber: number;
  readonly system: System;
}

export type UpState = 'none' | 'no-reading' | 'below' | 'over' | 'up';

/** Standing water in a drain is read as a level with a tape; everything else at a gauge. */
export function isLevelTest({ system, medium }: { system: System; medium: Medium }): boolean {
  return system === 'dwv' && medium === 'water';
}

export function findStanding(holds: readonly Hold[], part: TestedPart, stageCode: string): Hold | null {
  const isIt = (hold: Hold): boolean =>
    hold.state === 'standing' &&
    hold.stageCode === stageCode &&
    hold.unitNumber === part.unitNumber &&
    hold.system === part.system;
  return holds.find(isIt) ?? null;
}

/** The last reading that says something of the pipe itself: at a gauge, one with the valve open. */
export function lastCounted(hold: Hold): Reading | null {
  const counted = hold.readings.filter((one) => !one.isStruck && (isLevelTest(hold) || one.gaugeValve === 'open'));
  return latest(counted);
}

/** The last reading of all, whatever its valve. */
export function lastReading(hold: Hold): Reading | null {
  return latest(hold.readings.filter((one) => !one.isStruck));
}

function latest(readings: readonly Reading[]): Reading | null {
  const after = (a: Reading, b: Reading): boolean =>
    Date.parse(a.at) - Date.parse(b.at) > 0 || (a.at === b.at && a.receivedAt > b.receivedAt);
  return readings.reduce<Reading | null>((last, one) => (last !== null && after(last, one) ? last : one), null);
}

/** Whether a test stands as the server will count it for "test up". */
export function upState(hold: Hold | null): UpState {
  if (hold === null) return 'none';
  const reading = lastCounted(hold);
  if (reading === null) return 'no-reading';
  const { pressurePsi } = reading;
  if (pressurePsi === null) return 'up';
  if (hold.ceilingPsi !== null && pressurePsi > hold.ceilingPsi) return 'over';
  return hold.minimumPsi !== null && pressurePsi < hold.minimumPsi ? 'below' : 'up';
}

export function instrumentOf(hold: Hold): Instrument {
  const isLevel = isLevelTest(hold);
  return {
    isLevel,
    increment: (isLevel ? hold.tape?.incrementIn : hold.gauge?.incrementPsi) ?? 1,
    rangePsi: hold.gauge?.rangePsi ?? null,
    minimumPsi: hold.minimumPsi,
    ceilingPsi: hold.ceilingPsi,
  };
}

/** The visit that is open for a unit at a stage; there is one at most. */
export function findOpenVisit(
  visits: readonly VisitSummary[],
  stageCode: string,
  unitNumber: number,
): VisitSummary | null {
  const isOpen = (visit: VisitSummary): boolean => openVisitStates.some((state) => state === visit.state);
  return (
    visits.find((one) => isOpen(one) && one.stageCode === stageCode && one.unitNumbers.includes(unitNumber)) ?? null
  );
}
