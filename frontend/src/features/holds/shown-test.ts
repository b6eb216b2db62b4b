import type { AnalysedReading } from './test-analysis';
import type { SetupDraft } from './test-setup';
import type { AnalysisAsked } from './use-test-analysis';
import type { TestSheetInput } from './use-test-sheet';
import type { Instrument, TypedReading } from './typed-reading';

export interface TypedNow {
  readonly setup: SetupDraft;
  readonly instrument: Instrument;
  /** Null while something is missing or wrong: then only what was saved counts. */
  readonly reading: TypedReading | null;
  readonly now: Date;
}

/** The test as it would stand with the reading that is being typed; null while nothing of it is known. */
export function withTyped(
  { hold, part, rule }: Pick<TestSheetInput, 'hold' | 'part' | 'rule'>,
  { setup, instrument, reading, now }: TypedNow,
): AnalysisAsked['test'] {
  if (hold !== null)
    return reading === null ? hold : { ...hold, readings: [...hold.readings, asRead(reading, hold.readings, now)] };
  if (setup.medium === null || reading === null) return null;
  const { isLevel, increment, rangePsi, minimumPsi, ceilingPsi } = instrument;
  return {
    ...part,
    stageCode: rule.stageCode,
    medium: setup.medium,
    gauge: isLevel ? null : { rangePsi: rangePsi ?? 0, incrementPsi: increment },
    tape: isLevel ? { incrementIn: increment } : null,
    minimumPsi,
    ceilingPsi,
    settleMinutes: rule.settleMinutes,
    readings: [asRead(reading, [], now)],
  };
}

/** Taken now, or right after the last one where that phone's clock runs ahead. */
function asRead(reading: TypedReading, before: readonly AnalysedReading[], now: Date): AnalysedReading {
  const lastMs = Math.max(0, ...before.map(({ at }) => Date.parse(at)));
  const at = new Date(Math.max(now.getTime(), lastMs + 1000)).toISOString();
  return {
    at,
    receivedAt: at,
    pressurePsi: reading.pressurePsi ?? null,
    levelIn: reading.levelIn ?? null,
    temperatureF: reading.temperatureF ?? null,
    gaugeValve: reading.gaugeValve ?? null,
    isStruck: false,
  };
}
