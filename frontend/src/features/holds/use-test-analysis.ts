import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQuery } from '@tanstack/react-query';
import { departmentQuery } from '../departments/api/department';
import { ruleCardVersionQuery } from './api/rule-card-version';
import { temperatureOf, type TypedTemperatures } from './kept-temperatures';
import { analyseTest, isPlasticSystem, type AnalysedTest, type TestAnalysis, type TestTerms } from './test-analysis';

export interface AnalysisAsked {
  readonly lot: Pick<LotDetail, 'units' | 'departmentId' | 'ruleCard'>;
  /** Null: no test, nothing to work out. */
  readonly test: (AnalysedTest & { readonly unitNumber: number; readonly stageCode: string }) | null;
  readonly visit: VisitSummary | null;
  /** The rule of the card in force; a booked visit keeps its own version. */
  readonly rule: TestRule | null;
  readonly temperatures: Pick<TypedTemperatures, 'window' | 'coldest'>;
}

export interface FoundAnalysis {
  readonly test: AnalysedTest;
  readonly analysis: TestAnalysis;
  readonly terms: TestTerms;
}

/** A test worked out on this device, at once, by the code the server runs; null while it cannot be. */
export function useTestAnalysis({ lot, test, visit, rule, temperatures }: AnalysisAsked): FoundAnalysis | null {
  const elevationFt = useElevation(lot, test?.unitNumber ?? null, test !== null && test.medium !== 'water');
  const visitRule = useVisitRule(lot, visit, test, rule);
  if (test === null || elevationFt === null) return null;
  return findAnalysis({ lot, test, visit, rule: visitRule, temperatures }, elevationFt);
}

/** The same without asking anybody: the rule is the visit's own, `elevationFt` the site's. */
export function findAnalysis(
  { lot, test, visit, rule, temperatures }: AnalysisAsked,
  elevationFt: number,
): FoundAnalysis | null {
  if (test === null) return null;
  const house = lot.units.find(({ number }) => number === test.unitNumber)?.geometry ?? null;
  const window = visit !== null && isBooked(visit) ? visit.window : null;
  const terms: TestTerms = {
    elevationFt,
    standMinutes: rule?.standMinutes ?? null,
    isPlastic: isPlasticSystem(house, test.system),
    forecast: window && {
      from: window.startAt,
      to: window.endAt,
      temperatureF: temperatureOf(temperatures.window),
      coldestF: temperatureOf(temperatures.coldest),
    },
  };
  const analysis = analyseTest(test, terms);
  return analysis && { test, analysis, terms };
}

/** A window that is only wished for is none to stand for. */
const isBooked = ({ state }: VisitSummary): boolean => state === 'booked' || state === 'ready' || state === 'underway';

/** Feet above sea level: the site's own, else the department's. Water alone does not care. */
export function useElevation(lot: AnalysisAsked['lot'], unitNumber: number | null, hasAir: boolean): number | null {
  const { departmentId, units } = lot;
  const ownFt = units.find(({ number }) => number === unitNumber)?.geometry?.elevationFt ?? null;
  const isAsked = hasAir && ownFt === null && departmentId !== null;
  const department = useQuery({ ...departmentQuery(departmentId ?? ''), enabled: isAsked });
  if (!isAsked) return ownFt ?? 0;
  return department.data?.department.elevationFt ?? null;
}

function useVisitRule(
  { ruleCard }: AnalysisAsked['lot'],
  visit: VisitSummary | null,
  test: AnalysisAsked['test'],
  rule: TestRule | null,
): TestRule | null {
  const isOther = visit !== null && ruleCard !== null && visit.ruleCardVersion !== ruleCard.version;
  const asked = isOther ? { departmentId: visit.departmentId, version: visit.ruleCardVersion } : null;
  const card = useQuery({ ...ruleCardVersionQuery(asked), enabled: isOther });
  if (!isOther) return rule;
  const own = card.data?.content.tests.find((one) => one.stageCode === test?.stageCode && one.system === test.system);
  return own ?? rule;
}
