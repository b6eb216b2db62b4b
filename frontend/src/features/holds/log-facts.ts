import { explainedBy, testChartOf } from './test-chart-of';
import type { FoundAnalysis } from './use-test-analysis';

/** What the log says beside one reading; values as the reading's, psi or inches of water (less is a loss). */
export interface LogFact {
  readonly kind: 'gauge-only' | 'not-counted' | 'reference' | 'counted';
  /** Against the first counted reading, as read. */
  readonly since: number | null;
  /** What temperature alone would have made of the first counted reading: least and most over the rules of the medium. */
  readonly says: readonly [number, number] | null;
  /** What temperature leaves unexplained. */
  readonly left: number | null;
  /** Opened after shut readings: by how much the needle jumped, where by more than a mark. */
  readonly jumpedBy: number | null;
  /** Pumped up: from what. */
  readonly pumpedFrom: number | null;
  /** Shut readings and the one that opened: told to the second. */
  readonly isToTheSecond: boolean;
}

/** The facts of every reading that is not struck, by its instant. */
export function logFactsOf(found: FoundAnalysis): ReadonlyMap<number, LogFact> {
  const { test, analysis } = found;
  const { points, jumps, pumpedUp } = testChartOf(found);
  const reference = points.find(({ isUsed }) => isUsed);
  const facts = points.map((point, index): [number, LogFact] => {
    const wasShut = points[index - 1]?.isOpen === false;
    const jump = jumps.find(({ atMs }) => atMs === point.atMs);
    const isCounted = point.isUsed && reference !== undefined;
    const explained =
      isCounted && test.medium !== 'water' ? explainedBy(test, reference, point.temperatureF, analysis.patmPsi) : null;
    const says = explained === null ? null : ([Math.min(...explained), Math.max(...explained)] as const);
    return [
      point.atMs,
      {
        kind: !point.isOpen ? 'gauge-only' : !isCounted ? 'not-counted' : point === reference ? 'reference' : 'counted',
        since: isCounted ? point.value - reference.value : null,
        says,
        left: says === null ? null : outside(point.value, says),
        jumpedBy: jump === undefined ? null : jump.to - jump.from,
        pumpedFrom: pumpedUp?.atMs === point.atMs ? pumpedUp.from : null,
        isToTheSecond: !point.isOpen || wasShut,
      },
    ];
  });
  return new Map(facts);
}

function outside(value: number, [least, most]: readonly [number, number]): number {
  if (value < least) return value - least;
  return value > most ? value - most : 0;
}
