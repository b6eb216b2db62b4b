export type Units = 'us' | 'metric';

/** A number as printed, and the unit behind it. */
export interface Measure {
  readonly number: string;
  readonly unit: 'psi' | 'kPa' | 'ft' | 'm' | 'in' | 'cm' | '°F' | '°C';
}

/** NIST SP 811 (2008), appendix B.8: pound-force per square inch to kilopascal, foot to metre, inch to centimetre. */
const kPaPerPsi = 6.894757;
const mPerFt = 0.3048;
const cmPerIn = 2.54;

/**
 * A pressure as read: to half a mark of the gauge, never finer. `incrementPsi` is the gauge's smallest mark. A needle on a mark prints
 * without places: "116", between two "116.5".
 */
export function readPressure(pressurePsi: number, incrementPsi: number, units: Units = 'us'): Measure {
  return plainly(pressure(pressurePsi, incrementPsi / 2, units, 'nearest'));
}

/** A pressure worked out: to a whole mark of the gauge; its words say "about". */
export function workedPressure(pressurePsi: number, incrementPsi: number, units: Units = 'us'): Measure {
  return pressure(pressurePsi, incrementPsi, units, 'nearest');
}

/** A range worked out, rounded outward to whole marks: "57–59". */
export function pressureRange(fromPsi: number, toPsi: number, incrementPsi: number, units: Units = 'us'): Measure {
  const from = pressure(fromPsi, incrementPsi, units, 'down');
  const to = pressure(toPsi, incrementPsi, units, 'up');
  return { number: from.number === to.number ? from.number : `${from.number}–${to.number}`, unit: to.unit };
}

/** A height to 0.1 ft, or to 0.1 m, which is coarser. */
export function height(heightFt: number, units: Units = 'us'): Measure {
  return units === 'us'
    ? { number: heightFt.toFixed(1), unit: 'ft' }
    : { number: (heightFt * mPerFt).toFixed(1), unit: 'm' };
}

/** A level below the rim as the tape reads it: to half a mark. */
export function readLevel(levelIn: number, incrementIn: number, units: Units = 'us'): Measure {
  if (units === 'us') return plainly({ number: stepped(levelIn, incrementIn / 2, 'nearest'), unit: 'in' });
  return plainly({ number: stepped(levelIn * cmPerIn, niceStep((incrementIn / 2) * cmPerIn), 'nearest'), unit: 'cm' });
}

/** A temperature to a whole degree. */
export function temperature(temperatureF: number, units: Units = 'us'): Measure {
  if (units === 'us') return { number: String(Math.round(temperatureF)), unit: '°F' };
  return { number: String(Math.round(((temperatureF - 32) * 5) / 9)), unit: '°C' };
}

/** "57 psi". */
export function measureWords({ number, unit }: Measure): string {
  return `${number} ${unit}`;
}

type Rounding = 'nearest' | 'down' | 'up';

function pressure(psi: number, stepPsi: number, units: Units, rounding: Rounding): Measure {
  if (units === 'us') return { number: stepped(psi, stepPsi, rounding), unit: 'psi' };
  return { number: stepped(psi * kPaPerPsi, niceStep(stepPsi * kPaPerPsi), rounding), unit: 'kPa' };
}

function stepped(value: number, step: number, rounding: Rounding): string {
  const steps = value / step;
  // A value that sits on a mark but for floating error stays on it.
  const onMark = Math.abs(steps - Math.round(steps)) < 1e-6;
  const whole =
    onMark || rounding === 'nearest' ? Math.round(steps) : rounding === 'down' ? Math.floor(steps) : Math.ceil(steps);
  const places = Math.max(0, Math.min(3, decimals(step)));
  return (whole * step).toFixed(places);
}

/** Half a mark may print several places; zeros behind the point would claim more than was read. */
function plainly(measure: Measure): Measure {
  return { ...measure, number: String(Number(measure.number)) };
}

function decimals(step: number): number {
  return (String(Number(step.toFixed(6))).split('.')[1] ?? '').length;
}

/** The smallest of 1, 2, 5 times a power of ten that is not finer than `step`: metric never shows more than the gauge does. */
function niceStep(step: number): number {
  const power = 10 ** Math.floor(Math.log10(step));
  const times = [1, 2, 5, 10].find((one) => one * power >= step - 1e-9) ?? 10;
  return times * power;
}
