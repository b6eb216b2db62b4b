import type { MarkName } from '../../components/mark-names';
import { usualStandMinutes, type TestAnalysis, type TestTerms } from './test-analysis';

/** What a log comes to, in the order in which the first that applies is the headline. */
export const verdictKinds = [
  'over',
  'losing',
  'short',
  'settling',
  'few',
  'slow-fall',
  'temperature',
  'holds',
] as const;
export type VerdictKind = (typeof verdictKinds)[number];

export const verdictMarks: Readonly<Record<VerdictKind, MarkName>> = {
  over: 'test-over',
  losing: 'test-losing',
  short: 'test-short',
  settling: 'test-settling',
  few: 'test-few',
  'slow-fall': 'test-slow-fall',
  temperature: 'test-temperature',
  holds: 'test-holds',
};

/** The ground a verdict stands on; none for what asks nothing of anybody. */
export const verdictWashes: Readonly<Record<VerdictKind, string>> = {
  over: 'wash-red',
  losing: 'wash-red',
  short: 'wash-brass',
  settling: 'wash-none',
  few: 'wash-none',
  'slow-fall': 'wash-none',
  temperature: 'wash-water',
  holds: 'wash-water',
};

/** The headline of a test. Only a fall that temperature and stretching do not explain is ever called a loss. */
export function verdictKind(analysis: TestAnalysis): VerdictKind {
  const { verdict, gaugeFinding, forecast } = analysis;
  if (hasCaution(analysis, 'over-ceiling')) return 'over';
  if (verdict === 'dropping' || gaugeFinding === 'system-dropped') return 'losing';
  if (verdict === 'below' || isShort(forecast)) return 'short';
  if (verdict === 'settling') return 'settling';
  if (verdict === 'none' || verdict === 'too-soon' || forecast?.holdsThrough === 'maybe') return 'few';
  if (verdict === 'slow-fall') return 'slow-fall';
  return verdict === 'temperature' ? 'temperature' : 'holds';
}

function isShort(forecast: TestAnalysis['forecast']): boolean {
  if (forecast === null || forecast.holdsThrough === 'yes') return false;
  if (forecast.holdsThrough === 'no' || forecast.topUpTo !== null) return true;
  return hasReason(forecast, 'over-ceiling') || hasReason(forecast, 'over-ceiling-when-warm');
}

export const hasCaution = ({ cautions }: TestAnalysis, code: string): boolean =>
  cautions.some((caution) => caution.code === code);

export const hasReason = (forecast: TestAnalysis['forecast'], code: string): boolean =>
  forecast?.reasons.some((reason) => reason.code === code) ?? false;

const minuteMs = 60_000;
/** Nobody goes back to a gauge by the minute. */
const roundMs = 5 * minuteMs;
/** A trend is trusted for four times the span it was seen over (calculations, 4.7). */
const trustedSpans = 4;

/**
 * From when on a reading gives a trend that reaches the end of the window, to five minutes, never earlier; null where nothing counts yet, or
 * where that time is past the last reading already.
 */
export function trendKnownAt(
  analysis: TestAnalysis,
  terms: Pick<TestTerms, 'standMinutes' | 'forecast'>,
): number | null {
  const used = analysis.series.filter((point) => point.used);
  const [first, last] = [used[0], used.at(-1)];
  if (first === undefined || last === undefined) return null;
  const firstMs = Date.parse(first.at);
  const stood = firstMs + (terms.standMinutes ?? usualStandMinutes) * minuteMs;
  const endMs = terms.forecast === null ? null : Date.parse(terms.forecast.to);
  const trusted = endMs === null ? stood : (trustedSpans * firstMs + endMs) / (trustedSpans + 1);
  const at = Math.ceil(Math.max(stood, trusted) / roundMs) * roundMs;
  return at > Date.parse(last.at) ? at : null;
}

/** The end of the window that decides: its start, unless only its end may be short. */
export function decidingEnd(analysis: TestAnalysis, asked: { from: string; to: string }) {
  const { forecast, minimumPsi } = analysis;
  if (forecast === null) return null;
  const isLaterShort = minimumPsi !== null && forecast.from.low >= minimumPsi && forecast.to.low < minimumPsi;
  return isLaterShort ? { at: asked.to, ...forecast.to } : { at: asked.from, ...forecast.from };
}
