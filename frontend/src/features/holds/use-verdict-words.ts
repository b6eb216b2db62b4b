import type { TFunction } from 'i18next';
import { useMemo } from 'react';
import { useTranslation } from 'react-i18next';
import type { MarkName } from '../../components/mark-names';
import { localDateOf } from '../../lib/local-days';
import { useTimeWords, type TimeWords } from '../../lib/time';
import { measureWords, type Units } from '../../lib/units';
import { gaugeJumps } from './gauge-jump';
import { countedReadings, type AnalysedTest, type TestAnalysis, type TestTerms } from './test-analysis';
import { decidingEnd, hasReason, trendKnownAt, verdictKind, verdictMarks, type VerdictKind } from './verdict';
import { verdictMeasures, type VerdictMeasures } from './verdict-measures';

export interface VerdictAsked {
  readonly test: AnalysedTest;
  readonly analysis: TestAnalysis;
  readonly terms: TestTerms;
  readonly zone: string;
  readonly units: Units;
  readonly now: Date;
}

/** What a test's log says, in words. */
export interface VerdictWords {
  readonly kind: VerdictKind;
  readonly mark: MarkName;
  /** "It holds.", "Pump to 53 psi to be safe." */
  readonly headline: string;
  /** "About 49 psi (48–51) at 9:00 am, 47 °F."; null where nothing is expected. */
  readonly expects: string | null;
  /** How far it fell since it is counted. */
  readonly since: string | null;
  /** What the forecast rests on, or when to read again. */
  readonly basis: string | null;
  /** What shutting the gauge valve showed; its own line with its own mark. */
  readonly gauge: { readonly mark: MarkName; readonly text: string } | null;
}

/** The headline of a test with its lines, as the interface guide orders them, in the reader's language. */
export function useVerdictWords(): (asked: VerdictAsked) => VerdictWords {
  const { t } = useTranslation(['holds', 'common']);
  const time = useTimeWords();
  return useMemo(() => (asked) => wordsOf({ ...asked, t, time }), [t, time]);
}

interface Asked extends VerdictAsked {
  readonly t: TFunction<['holds', 'common']>;
  readonly time: TimeWords;
}

function wordsOf(asked: Asked): VerdictWords {
  const { analysis, t } = asked;
  const kind = verdictKind(analysis);
  const measures = verdictMeasures(analysis, asked.units);
  const bare = { kind, mark: verdictMarks[kind], headline: headlineOf(kind, asked, measures) };
  // over the limit stands alone
  if (kind === 'over') return { ...bare, expects: null, since: null, basis: null, gauge: null };
  return {
    ...bare,
    expects: kind === 'losing' ? null : expectedWords(asked, measures),
    since: kind === 'settling' ? t('verdict.settlingText') : sinceWords(asked, measures),
    basis: kind === 'losing' ? null : basisWords(asked),
    gauge: gaugeWords(asked, measures),
  };
}

/** "9:00 am" of today; any other day is named. */
function timeOf({ now, zone, time }: Asked, at: string | number): string {
  const instant = new Date(at);
  return localDateOf(instant, zone) === localDateOf(now, zone)
    ? time.clock(instant, zone)
    : time.dayClock(instant, zone);
}

function headlineOf(kind: VerdictKind, asked: Asked, measures: VerdictMeasures): string {
  const { analysis, terms, t } = asked;
  switch (kind) {
    case 'over':
      return t('cautions.overLimit', { limit: measureWords(measures.read(asked.test.ceilingPsi ?? 0)) });
    case 'losing':
      return losingWords(asked, measures);
    case 'short':
      return shortWords(asked, measures);
    case 'settling':
      return t('verdict.settling', { time: timeOf(asked, analysis.settledAt ?? asked.now.getTime()) });
    case 'few': {
      if (analysis.verdict === 'none') return t('verdict.none');
      const at = trendKnownAt(analysis, terms);
      if (at === null) return t('verdict.again');
      return at <= asked.now.getTime() ? t('verdict.fewNow') : t('verdict.few', { time: timeOf(asked, at) });
    }
    case 'slow-fall':
      return t('verdict.slowFall', { drop: dropOf(analysis, measures), length: lengthOf(asked) });
    case 'temperature':
      return t(analysis.forecast === null ? 'verdict.temperature' : 'verdict.temperatureHolds');
    default:
      if (analysis.isLevel) return t('verdict.levelHolds');
      return t(analysis.forecast === null ? 'verdict.holdsSoFar' : 'verdict.holds');
  }
}

/** A rate finer than the gauge is told as the time one mark takes. */
function losingWords({ analysis, t }: Asked, measures: VerdictMeasures): string {
  if (analysis.verdict !== 'dropping') return t('verdict.behindValve');
  const rate = Math.min(...(analysis.slopePerHour ?? [0]).map(Math.abs));
  if (rate >= analysis.increment) return t('verdict.losing', { rate: measureWords(measures.worked(rate)) });
  const hours = rate > 0 ? Math.round(analysis.increment / rate) : 0;
  if (hours < 1 || hours > 240) return t('verdict.losingSome');
  return t('verdict.losingSlowly', { count: hours, step: measureWords(measures.worked(analysis.increment)) });
}

function shortWords(asked: Asked, measures: VerdictMeasures): string {
  const { analysis, test, t } = asked;
  const { forecast } = analysis;
  const topUpTo = forecast?.topUpTo ?? null;
  if (topUpTo !== null) {
    const to = measureWords(measures.up(topUpTo));
    return t(forecast?.holdsThrough === 'maybe' ? 'verdict.pumpSafe' : 'verdict.pump', { to });
  }
  const limit = measureWords(measures.read(test.ceilingPsi ?? 0));
  if (hasReason(forecast, 'over-ceiling')) return t('verdict.shortOverLimit', { limit });
  if (hasReason(forecast, 'over-ceiling-when-warm')) return t('verdict.shortOverWhenWarm', { limit });
  return t('verdict.below', { minimum: measureWords(measures.read(analysis.minimumPsi ?? 0)) });
}

function expectedWords(asked: Asked, measures: VerdictMeasures): string | null {
  const { analysis, terms, t } = asked;
  const end = terms.forecast && decidingEnd(analysis, terms.forecast);
  if (terms.forecast === null || end === null) return null;
  const { temperatureF } = terms.forecast;
  const said = {
    psi: measureWords(measures.worked(end.mid)),
    range: measures.range(end.low, end.high).number,
    time: timeOf(asked, end.at),
  };
  if (temperatureF === null) {
    const staysF = asked.test.medium === 'water' ? null : lastTemperature(asked);
    if (staysF === null) return t('verdict.expects', said);
    return t('verdict.expectsStays', { ...said, temperature: measureWords(measures.temperature(staysF)) });
  }
  return t('verdict.expectsAt', { ...said, temperature: measureWords(measures.temperature(temperatureF)) });
}

/** Of the last reading that counts: what air is taken to stay at where nobody typed the window's. */
function lastTemperature({ analysis, test }: Asked): number | null {
  const last = analysis.series.findLast(({ used }) => used);
  const isIt = ({ at }: { at: string }): boolean => last !== undefined && Date.parse(at) === Date.parse(last.at);
  return countedReadings(test).find(isIt)?.temperatureF ?? null;
}

const dropOf = ({ drop }: TestAnalysis, measures: VerdictMeasures): string =>
  measureWords(measures.worked(drop?.[0] ?? 0));

function lengthOf({ analysis, time }: Asked): string {
  const used = analysis.series.filter((point) => point.used);
  const [first, last] = [used[0], used.at(-1)];
  return first === undefined || last === undefined
    ? ''
    : time.duration((Date.parse(last.at) - Date.parse(first.at)) / 60_000);
}

/** "Down 1 psi since Tue, Apr 14, 6:05 pm", or that nothing fell; nothing from a single reading. */
function sinceWords(asked: Asked, measures: VerdictMeasures): string | null {
  const { analysis, t } = asked;
  const used = analysis.series.filter((point) => point.used);
  const [first] = used;
  if (first === undefined || used.length < 2 || analysis.rawDrop === null || analysis.drop === null) return null;
  const time = timeOf(asked, first.at);
  const fell = measures.read(analysis.rawDrop);
  if (Number(fell.number) <= 0) return t('verdict.noDrop', { time });
  const drop = measureWords(fell);
  const left = measures.worked(Math.max(0, analysis.drop[0]));
  const isCorrected = Math.abs(analysis.rawDrop - analysis.drop[0]) > analysis.increment / 2;
  if (!isCorrected) return t('verdict.down', { drop, time });
  if (Number(left.number) === 0) return t('verdict.downExplained', { drop, time });
  return t('verdict.downCorrected', { drop, time, left: measureWords(left) });
}

function basisWords(asked: Asked): string | null {
  const { analysis, terms, t } = asked;
  if (analysis.forecast === null) return null;
  const used = analysis.series.filter((point) => point.used).length;
  if (analysis.forecast.basis === 'trend') return t('verdict.trend', { count: used });
  const at = trendKnownAt(analysis, terms);
  if (verdictKind(analysis) === 'few' || at === null) return used === 1 ? t('verdict.oneReading') : null;
  if (at <= asked.now.getTime()) return t('verdict.fewNow');
  return t(used === 1 ? 'verdict.oneReadingAgain' : 'verdict.closeAgain', { time: timeOf(asked, at) });
}

function gaugeWords({ analysis, test, t }: Asked, measures: VerdictMeasures): VerdictWords['gauge'] {
  const { gaugeFinding } = analysis;
  if (gaugeFinding === null || gaugeFinding === 'gauge-sound') return null;
  if (gaugeFinding === 'system-dropped') return { mark: 'test-losing', text: t('verdict.gauge.system-dropped') };
  const jumps = gaugeFinding === 'gauge-leaks-system-held' ? gaugeJumps(test) : [];
  const [jump] = jumps.sort((a, b) => b.toPsi - b.fromPsi - (a.toPsi - a.fromPsi));
  if (jump === undefined) return { mark: 'test-gauge', text: t(`verdict.gauge.${gaugeFinding}`) };
  const [from, to] = [measures.read(jump.fromPsi).number, measureWords(measures.read(jump.toPsi))];
  return { mark: 'test-gauge', text: t('verdict.gauge.jumped', { from, to }) };
}
