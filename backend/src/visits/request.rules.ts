import type { RuleCardContent, Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ErrorCode } from '@holdwater/shared-types/errors/catalogue.js';
import type { OpenCorrection } from './requested-lots.queries.js';

/** A lot somebody wants a visit on, with all that speaks for or against it. Units are of this stage. */
export interface LotAsked {
  readonly id: string;
  readonly number: string;
  readonly permitStatus: string;
  /** As asked; absent: every unit that has not passed. */
  readonly unitsAsked: readonly number[] | undefined;
  readonly units: readonly number[];
  readonly passedUnits: readonly number[];
  readonly openVisitUnits: readonly number[];
  readonly failedUnits: readonly number[];
  readonly corrections: readonly OpenCorrection[];
}

export interface Refusal {
  readonly code: ErrorCode;
  readonly params: Record<string, unknown>;
}

/** The units a request is for: those asked, or all that have not passed this stage. */
export function unitsOf(lot: LotAsked): number[] {
  return [...new Set(lot.unitsAsked ?? lot.units.filter((unit) => !lot.passedUnits.includes(unit)))].sort(
    (a, b) => a - b,
  );
}

/** Units asked for that the lot does not have. */
export function unknownUnits(lot: LotAsked): number[] {
  return (lot.unitsAsked ?? []).filter((unit) => !lot.units.includes(unit));
}

/**
 * Why these lots cannot have a visit of this stage, the first reason that applies, with every lot it applies to; null when they can.
 * In the order a person is told: the permit, corrections, a stage already passed, a visit already open.
 */
export function refusalOf(
  lots: readonly LotAsked[],
  stage: Stage,
  content: Pick<RuleCardContent, 'asking' | 'stages'>,
): Refusal | null {
  const isLast = content.stages.every(({ order }) => order <= stage.order);
  const checks: Array<[ErrorCode, (lot: LotAsked) => number]> = [
    ['permit-not-issued', (lot) => Number(content.asking.isPermitNeeded && lot.permitStatus !== 'issued')],
    ['corrections-open', (lot) => correctionsInTheWay(lot, stage.code, isLast)],
    ['stage-passed', (lot) => Number(isPassed(lot))],
    ['open-visit-exists', (lot) => Number(shares(unitsOf(lot), lot.openVisitUnits))],
  ];
  for (const [code, countOf] of checks) {
    const counts = lots.map(countOf);
    const count = counts.reduce((sum, each) => sum + each, 0);
    const numbers = lots.filter((_, index) => (counts[index] ?? 0) > 0).map(({ number }) => number);
    if (count > 0) return { code, params: { count, lots: numbers, stageCode: stage.code } };
  }
  return null;
}

/** A request after a visit of this stage that failed is a re-test. */
export function isRetestOf(lot: LotAsked): boolean {
  return shares(unitsOf(lot), lot.failedUnits);
}

/** Open corrections of this stage and these units; before the last stage also what had to be fixed before final. */
function correctionsInTheWay(lot: LotAsked, stageCode: string, isLast: boolean): number {
  const units = unitsOf(lot);
  return lot.corrections.filter(
    (each) =>
      units.includes(each.unitNumber) &&
      (each.stageCode === stageCode || (isLast && each.severity === 'fix-before-final')),
  ).length;
}

function isPassed(lot: LotAsked): boolean {
  const units = unitsOf(lot);
  return units.length === 0 || shares(units, lot.passedUnits);
}

function shares(some: readonly number[], others: readonly number[]): boolean {
  return some.some((each) => others.includes(each));
}
