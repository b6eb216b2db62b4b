import { localCode } from '../cautions.js';
import { cautionOf, when, type Caution } from '../findings.js';
import { isAbove, isBelow } from '../tolerance.js';
import type { Forecast } from './forecast.js';
import type { HoldLog } from './hold-log.js';
import { instantOf } from './instant-of.js';
import type { Standing } from './standing.js';
import { msPerHour } from './trend.js';

const freezingF = 32;
const nearFreezingF = 36;
/** Air over water gives noticeably into it after so many hours. */
const dissolvingHours = 8;
/** Readings of sealed water farther apart in temperature cannot be compared. */
const comparableWaterF = 2;
const comparableLevelF = 5;

/** Cautions that the readings and the forecast raise, the gravest first. */
export function holdCautions(log: HoldLog, standing: Standing, forecast: Forecast | null): Caution[] {
  return [
    ...overCeiling(log, standing),
    ...when(hasAir(log), () => cautionOf('compressed-air')),
    ...when(log.readings.at(-1)?.isOpen === false, () => cautionOf('shut-gauge')),
    ...(log.medium === null ? [] : [cautionOf('under-pressure')]),
    ...freezing(log),
    ...warming(log, standing),
    ...unlikeTemperatures(log, standing),
    ...dissolving(log, standing),
    ...settling(standing),
    ...when(forecast !== null && forecast.topUpTo !== null && log.medium !== null, () => cautionOf('close-the-main')),
    ...when(hasAir(log) && standing.readings.some(({ temperatureF }) => temperatureF === null), () =>
      cautionOf('temperature-missing'),
    ),
    ...when(standing.used.length === 1, () => cautionOf('one-reading')),
    ...when(standing.topUps >= 2, () => cautionOf('many-top-ups', { topUps: standing.topUps })),
    localCode(),
  ];
}

const hasAir = ({ medium }: HoldLog): boolean => medium === 'air' || medium === 'water-topped-with-air';

function overCeiling({ ceiling }: HoldLog, { open }: Standing): Caution[] {
  const lastOpen = open.at(-1);
  if (!lastOpen || ceiling === null || !isAbove(lastOpen.value, ceiling)) return [];
  return [cautionOf('over-ceiling', { psi: lastOpen.value, ceilingPsi: ceiling })];
}

function freezing({ forecast }: HoldLog): Caution[] {
  const coldestF = forecast?.coldestF ?? forecast?.temperatureF ?? null;
  if (coldestF === null || isAbove(coldestF, nearFreezingF)) return [];
  return [cautionOf(isAbove(coldestF, freezingF) ? 'freeze-risk' : 'freeze', { coldestF })];
}

/** A line full of sealed water climbs fast in the sun: the warmest air expected counts. */
function warming({ medium, forecast, ceiling }: HoldLog, { open }: Standing): Caution[] {
  const lastF = open.at(-1)?.temperatureF ?? null;
  if (medium !== 'water' || !forecast || lastF === null) return [];
  const warmestF = Math.max(forecast.temperatureF ?? -Infinity, forecast.hottestF ?? -Infinity);
  if (!isAbove(warmestF, lastF)) return [];
  return [cautionOf('sealed-water-warms', { warmestF, lastF, ...(ceiling === null ? {} : { ceilingPsi: ceiling }) })];
}

function unlikeTemperatures(log: HoldLog, { open, reference }: Standing): Caution[] {
  const known = open.map(({ temperatureF }) => temperatureF).filter((value) => value !== null);
  const [first] = known;
  if (first === undefined || hasAir(log)) return [];
  const spreadF = Math.max(...known) - Math.min(...known);
  if (log.medium === null)
    return when(isAbove(spreadF, comparableLevelF), () => cautionOf('level-moves-with-temperature', { spreadF }));
  const nearF = reference?.temperatureF ?? first;
  return when(isAbove(spreadF, comparableWaterF), () =>
    cautionOf('water-temperature', { spreadF, temperatureF: nearF }),
  );
}

function dissolving({ medium, forecast }: HoldLog, { readings }: Standing): Caution[] {
  const [first] = readings;
  if (medium !== 'water-topped-with-air' || !forecast || !first) return [];
  const hours = (forecast.toMs - first.atMs) / msPerHour;
  return when(!isBelow(hours, dissolvingHours), () => cautionOf('air-dissolves', { hours }));
}

function settling({ open, used, settledAtMs }: Standing): Caution[] {
  if (open.length === 0 || used.length > 0 || settledAtMs === null) return [];
  return [cautionOf('settling', { settledAt: instantOf(settledAtMs) })];
}
