import { addDays, localDateOf, minutesOfDay } from '../../lib/local-days';
import { parseNumber } from './typed-reading';

/** Air in the house as the plumber typed it, °F: now, at the window, coldest tonight. Empty where nobody typed it. */
export interface TypedTemperatures {
  readonly now: string;
  readonly window: string;
  readonly coldest: string;
}
export const noTemperatures: TypedTemperatures = { now: '', window: '', coldest: '' };

interface Kept extends TypedTemperatures {
  readonly evening: string;
  readonly at: number;
}

const storageKey = 'holdwater.temperatures';
const noonMinutes = 12 * 60;
/** How long "air now" is worth keeping from lot to lot: it goes with a reading, and a stale one would make a leak of a cold night. */
const nowLastsMs = 60 * 60_000;

/** An evening lasts from noon to noon on the wall clock of the lot. */
export function eveningOf(at: Date, zone: string): string {
  const date = localDateOf(at, zone);
  return minutesOfDay(at, zone) < noonMinutes ? addDays(date, -1) : date;
}

/** What was typed for this tract on this device this evening. */
export function readTemperatures(tract: string, zone: string, now: Date): TypedTemperatures {
  const kept = allKept()[tract];
  if (kept === undefined || kept.evening !== eveningOf(now, zone)) return noTemperatures;
  const isFresh = Math.abs(now.getTime() - kept.at) <= nowLastsMs;
  return { now: isFresh ? kept.now : '', window: kept.window, coldest: kept.coldest };
}

/** Keeps them for the tract; what no thermometer shows is not kept. */
export function keepTemperatures(tract: string, zone: string, typed: TypedTemperatures, now: Date): void {
  const evening = eveningOf(now, zone);
  const tonight = Object.entries(allKept()).filter(([, kept]) => kept.evening === evening);
  const kept: Kept = {
    now: sane(typed.now),
    window: sane(typed.window),
    coldest: sane(typed.coldest),
    evening,
    at: now.getTime(),
  };
  try {
    window.localStorage.setItem(storageKey, JSON.stringify({ ...Object.fromEntries(tonight), [tract]: kept }));
  } catch {
    // Storage may be blocked: they are then typed again.
  }
}

/** A typed temperature; null for none, and for what is not one a house can have. */
export function temperatureOf(typed: string): number | null {
  const value = parseNumber(typed);
  return value === null || value < -60 || value > 160 ? null : value;
}

const sane = (typed: string): string => (temperatureOf(typed) === null ? '' : typed.trim());

function allKept(): Record<string, Kept> {
  try {
    const kept: unknown = JSON.parse(window.localStorage.getItem(storageKey) ?? '{}');
    if (typeof kept !== 'object' || kept === null) return {};
    return Object.fromEntries(Object.entries(kept).filter((entry): entry is [string, Kept] => isKept(entry[1])));
  } catch {
    return {};
  }
}

function isKept(value: unknown): value is Kept {
  if (typeof value !== 'object' || value === null) return false;
  const { now, window: atWindow, coldest, evening, at } = value as Partial<Record<keyof Kept, unknown>>;
  return [now, atWindow, coldest, evening].every((one) => typeof one === 'string') && typeof at === 'number';
}
