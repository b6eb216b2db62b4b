import type { GaugeFinding, HoldVerdict, Pair } from '../hold.contract.js';
import type { Caution } from '../findings.js';
import { forecastOf, type Forecast } from './forecast.js';
import { gaugeFindingOf } from './gauge-finding.js';
import { holdCautions } from './hold-cautions.js';
import type { HoldLog, LogReading } from './hold-log.js';
import { carry } from './rules.js';
import { standingOf, type Standing } from './standing.js';
import { trendOf, type Trend } from './trend.js';
import { verdictOf, type Drops } from './verdict.js';

/** Everything a log says, the same for pressure and level. */
export interface Study {
  standing: Standing;
  drops: Drops | null;
  trend: Trend | null;
  verdict: HoldVerdict;
  gaugeFinding: GaugeFinding | null;
  series: { reading: LogReading; corrected: Pair; isUsed: boolean }[];
  forecast: Forecast | null;
  cautions: Caution[];
}

export function studyOf(log: HoldLog): Study {
  const standing = standingOf(log);
  const trend = trendOf(standing.used, log.rules, log.increment);
  const drops = dropsOf(log, standing);
  const verdict = verdictOf(log, standing, drops, trend);
  const forecast = forecastOf(log, standing, trend, verdict);
  return {
    standing,
    drops,
    trend,
    verdict,
    gaugeFinding: gaugeFindingOf(log, standing),
    series: seriesOf(log, standing),
    forecast,
    cautions: holdCautions(log, standing, forecast),
  };
}

/** The smaller and the larger of the rules' values. */
export const pairOf = (values: readonly number[]): Pair => [Math.min(...values), Math.max(...values)];

function dropsOf(log: HoldLog, { reference, last }: Standing): Drops | null {
  if (!reference || !last) return null;
  return {
    raw: reference.value - last.value,
    corrected: correctedBy(log, last, reference).map((value) => reference.value - value),
  };
}

const correctedBy = ({ rules }: HoldLog, reading: LogReading, reference: LogReading | null): number[] =>
  rules.map((rule) => carry(rule, reading.value, reading.temperatureF, reference?.temperatureF ?? null));

function seriesOf(log: HoldLog, { open, used, reference }: Standing): Study['series'] {
  const isUsed = new Set(used);
  return open.map((reading) => ({
    reading,
    corrected: pairOf(correctedBy(log, reading, reference)),
    isUsed: isUsed.has(reading),
  }));
}
