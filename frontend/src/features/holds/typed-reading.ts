import type { GaugeValve } from '@holdwater/shared-types/holds/hold.states.js';

/** A reading as it is sent: what was typed and nothing else. */
export interface TypedReading {
  readonly pressurePsi?: number;
  readonly levelIn?: number;
  readonly temperatureF?: number;
  readonly gaugeValve?: GaugeValve;
  readonly note?: string;
}

/** A reading as it is being typed. */
export interface ReadingDraft {
  /** psi at the gauge, or inches below the rim. */
  readonly value: string;
  readonly valve: GaugeValve | null;
  readonly temperatureF: string;
  readonly note: string;
}

export const emptyReading: ReadingDraft = { value: '', valve: null, temperatureF: '', note: '' };

/** What the reading is taken with. */
export interface Instrument {
  /** Standing water in a drain is read as a level with a tape; everything else at a gauge. */
  readonly isLevel: boolean;
  /** The smallest mark: psi, or inches. */
  readonly increment: number;
  readonly rangePsi: number | null;
  readonly minimumPsi: number | null;
  /** The lowest-rated part, at the gauge. */
  readonly ceilingPsi: number | null;
}

export interface ReadingCheck {
  /** Null while something is missing or wrong. */
  readonly reading: TypedReading | null;
  readonly faults: Readonly<Partial<Record<'value' | 'valve' | 'temperatureF', string>>>;
  /** What was likely meant by a value beyond the gauge. */
  readonly meant: number | null;
  readonly isBelowMinimum: boolean;
  readonly isOverLimit: boolean;
}

const deepestIn = 1200;
const coldestF = -60;
const hottestF = 160;

/** A number as people type it, with a point or a comma; null for anything else. */
export function parseNumber(typed: string): number | null {
  const plain = typed.trim().replace(',', '.');
  return /^-?\d+(\.\d+)?$/.test(plain) ? Number(plain) : null;
}

/** Checks a reading the way the server does, before it is sent. */
export function checkReading(draft: ReadingDraft, instrument: Instrument): ReadingCheck {
  const value = parseNumber(draft.value);
  const temperature = draft.temperatureF.trim() === '' ? undefined : parseNumber(draft.temperatureF);
  const faults = { ...valueFault(draft.value, value, instrument), ...temperatureFault(temperature) };
  const isOpen = instrument.isLevel || draft.valve === 'open';
  const isValveMissing = !instrument.isLevel && draft.valve === null;
  const isWhole = value !== null && !isValveMissing && Object.keys(faults).length === 0;
  const { minimumPsi, ceilingPsi, rangePsi } = instrument;
  return {
    reading: isWhole ? readingOf(draft, instrument, value, temperature ?? undefined) : null,
    faults: { ...faults, ...(value !== null && isValveMissing ? { valve: 'required' } : {}) },
    meant: value === null || rangePsi === null || value <= rangePsi ? null : meantBy(value, rangePsi),
    isBelowMinimum: isOpen && value !== null && minimumPsi !== null && value < minimumPsi,
    // shut or open: whatever the needle shows is on the gauge, its hose and the fitting beside whoever reads it
    isOverLimit: value !== null && ceilingPsi !== null && faults.value === undefined && value > ceilingPsi,
  };
}

function valueFault(typed: string, value: number | null, { isLevel, rangePsi }: Instrument): { value?: string } {
  if (typed.trim() === '') return {};
  if (value === null) return { value: 'must-be-a-number' };
  if (value < 0) return { value: 'must-not-be-negative' };
  if (isLevel) return value > deepestIn ? { value: 'out-of-range' } : {};
  return rangePsi !== null && value > rangePsi ? { value: 'above-gauge-range' } : {};
}

function temperatureFault(temperatureF: number | null | undefined): { temperatureF?: string } {
  if (temperatureF === undefined) return {};
  if (temperatureF === null) return { temperatureF: 'must-be-a-number' };
  return temperatureF < coldestF || temperatureF > hottestF ? { temperatureF: 'out-of-range' } : {};
}

/** One digit too many is what happens with wet hands. */
function meantBy(value: number, rangePsi: number): number | null {
  const shorter = Math.trunc(value / 10);
  return shorter > 0 && shorter <= rangePsi ? shorter : null;
}

function readingOf(draft: ReadingDraft, { isLevel }: Instrument, value: number, temperatureF?: number): TypedReading {
  const note = draft.note.trim();
  return {
    ...(isLevel ? { levelIn: value } : { pressurePsi: value, gaugeValve: draft.valve ?? undefined }),
    ...(temperatureF === undefined ? {} : { temperatureF }),
    ...(note === '' ? {} : { note }),
  };
}

/** The value half a mark up or down; from nothing typed it starts at `from`. */
export function stepValue(typed: string, steps: 1 | -1, increment: number, from: number): string {
  const half = increment / 2;
  const value = parseNumber(typed);
  if (value === null) return tidy(Math.max(0, from));
  return tidy(Math.max(0, Math.round((value + steps * half) / half) * half));
}

function tidy(value: number): string {
  return String(Number(value.toFixed(4)));
}
