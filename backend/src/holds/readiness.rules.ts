import type { Medium, System } from '@holdwater/shared-types/holds/hold.states.js';
import { refuse } from '../common/errors/app-error.js';
import type { StandingHold } from './holds.queries.js';
import { isLevelTest } from './reading.rules.js';

export interface CountedReading {
  readonly id: string;
  readonly madeAt: Date;
  readonly receivedAt: Date;
  readonly pressurePsi: number | null;
  readonly gaugeValve: 'open' | 'shut' | null;
  readonly struckAt: Date | null;
}

export interface StandingTest {
  readonly unitNumber: number;
  readonly system: System;
  readonly medium: Medium;
  readonly minimumPsi: number | null;
  readonly ceilingPsi: number | null;
  readonly readings: readonly CountedReading[];
}

export interface RequiredTest {
  readonly unitNumber: number;
  readonly system: System;
}

export type MissingWhy = 'no-test' | 'no-open-reading' | 'below-minimum';
export interface MissingTest extends RequiredTest {
  readonly why: MissingWhy;
}

/** A test that must be let down before anything else is said about it. */
export interface OverLimit extends RequiredTest {
  readonly pressurePsi: number;
  readonly ceilingPsi: number;
}

export interface Readiness {
  readonly missing: readonly MissingTest[];
  readonly overLimit: OverLimit | null;
  /** The reading that counts of every required system; complete only where nothing is missing. */
  readonly readingIds: readonly string[];
}

/** Every required system of every unit of a visit, by unit and in the card's order of systems. */
export function requiredTests(unitNumbers: readonly number[], systems: readonly System[]): RequiredTest[] {
  return [...unitNumbers]
    .sort((a, b) => a - b)
    .flatMap((unitNumber) => systems.map((system) => ({ unitNumber, system })));
}

/**
 * Whether the tests of a visit stand: each required system needs a standing test with a counted reading. At a gauge that is the last
 * reading with the valve open, at the minimum or above it; a shut valve tells of the gauge and its hose only.
 */
export function readinessOf(required: readonly RequiredTest[], standing: readonly StandingTest[]): Readiness {
  const missing: MissingTest[] = [];
  const readingIds: string[] = [];
  let overLimit: OverLimit | null = null;
  for (const each of required) {
    const test = standing.find((one) => one.unitNumber === each.unitNumber && one.system === each.system);
    const reading = test && lastCounted(test);
    const why = whyMissing(test, reading);
    if (why !== null) missing.push({ ...each, why });
    if (reading) readingIds.push(reading.id);
    overLimit ??= overLimitOf(each, test, reading);
  }
  return { missing, overLimit, readingIds };
}

/** The readings a statement may rest on now. @throws over-limit, reading-missing */
export function requireStanding(
  required: readonly RequiredTest[],
  standing: readonly StandingTest[],
): readonly string[] {
  const { missing, overLimit, readingIds } = readinessOf(required, standing);
  if (overLimit !== null) refuse('over-limit', { ...overLimit });
  if (missing.length > 0) refuse('reading-missing', { missing });
  return readingIds;
}

/** A standing test as the rules look at it. */
export function standingTest({ hold, readings }: StandingHold): StandingTest {
  const { unitNumber, system, medium, minimumPsi, ceilingPsi } = hold;
  return { unitNumber, system, medium, minimumPsi, ceilingPsi, readings };
}

/** The same as it stood at an instant: only what had been read by then. */
export function standingBy(at: Date): (standing: StandingHold) => StandingTest {
  return (standing) => {
    const test = standingTest(standing);
    return { ...test, readings: test.readings.filter(({ madeAt }) => madeAt <= at) };
  };
}

/** The last reading that says something of the pipe itself; late arrivals take the place of the time they were made at. */
export function lastCounted(test: Pick<StandingTest, 'system' | 'medium' | 'readings'>): CountedReading | undefined {
  return test.readings
    .filter((reading) => reading.struckAt === null && (isLevelTest(test) || reading.gaugeValve === 'open'))
    .reduce<CountedReading | undefined>(
      (last, reading) => (last && isLater(last, reading) ? last : reading),
      undefined,
    );
}

function isLater(a: CountedReading, b: CountedReading): boolean {
  return (
    a.madeAt.getTime() - b.madeAt.getTime() > 0 ||
    (a.madeAt.getTime() === b.madeAt.getTime() && a.receivedAt > b.receivedAt)
  );
}

function whyMissing(test: StandingTest | undefined, reading: CountedReading | undefined): MissingWhy | null {
  if (test === undefined) return 'no-test';
  if (reading === undefined) return 'no-open-reading';
  const isBelow = test.minimumPsi !== null && reading.pressurePsi !== null && reading.pressurePsi < test.minimumPsi;
  return isBelow ? 'below-minimum' : null;
}

function overLimitOf(
  required: RequiredTest,
  test: StandingTest | undefined,
  reading: CountedReading | undefined,
): OverLimit | null {
  const ceilingPsi = test?.ceilingPsi ?? null;
  const pressurePsi = reading?.pressurePsi ?? null;
  if (ceilingPsi === null || pressurePsi === null || pressurePsi <= ceilingPsi) return null;
  return { ...required, pressurePsi, ceilingPsi };
}
