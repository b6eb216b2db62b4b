import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import { dwvMethods, type Medium, type Method, type System } from '@holdwater/shared-types/holds/hold.states.js';
import { ownFillLevelFt } from '@holdwater/shared-types/hydraulics/dwv-fill-level.js';
import { requiredIncrementPsi } from '@holdwater/shared-types/hydraulics/gauge-rule.js';
import { headPsi } from '@holdwater/shared-types/hydraulics/water.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { NewHold } from './api/start-hold';
import { isLevelTest } from './standing-tests';
import { parseNumber, type Instrument } from './typed-reading';

/** A test as it is being set up; numbers as typed. */
export interface SetupDraft {
  readonly method: Method | null;
  readonly medium: Medium | null;
  readonly rangePsi: string;
  readonly incrementPsi: string;
  readonly incrementIn: string;
  readonly fillLevelFt: string;
  readonly ceilingPsi: string;
}

export type SetupField = keyof SetupDraft;
export type SetupFaults = Readonly<Partial<Record<SetupField, string>>>;

/** The gauge and tape used last on this device. */
export type KeptTools = Pick<SetupDraft, 'rangePsi' | 'incrementPsi' | 'incrementIn'>;
export const noTools: KeptTools = { rangePsi: '', incrementPsi: '', incrementIn: '' };

/** The media a method may be filled with under a rule: air by air, other drain methods by water, lines by what has a pressure. */
export function mediaFor(rule: TestRule, method: Method | null): Medium[] {
  if (rule.system === 'water') return rule.pressures.map(({ medium }) => medium);
  if (method === null) return [];
  return method === 'air' ? ['air'] : ['water'];
}

/** Where a method fills the house to, feet above the first floor; unknown where nobody measured it. */
export function ownLevelFt(method: Method | null, house: HouseGeometry | null): number | null {
  const dwvMethod = dwvMethods.find((one) => one === method);
  if (dwvMethod === undefined || house === null) return null;
  // the usual riser, as the plan takes it
  return ownFillLevelFt({ ...house, method: dwvMethod, riserIn: 18 });
}

/** What a test of this system begins with: the last one's way, else the only one there is; the tools used last. */
export function firstSetup(
  rule: TestRule,
  house: HouseGeometry | null,
  earlier: Hold | null,
  tools: KeptTools,
): SetupDraft {
  const only = rule.acceptedMethods.length === 1 ? (rule.acceptedMethods[0] ?? null) : null;
  const isStillAccepted = earlier !== null && rule.acceptedMethods.includes(earlier.method);
  const bare = { ...tools, method: null, medium: null, fillLevelFt: '', ceilingPsi: '' };
  return withMethod(bare, isStillAccepted ? earlier.method : only, rule, house);
}

/** The draft with another method: its only medium, its own fill level, the lowest-rated part as the house has it. */
export function withMethod(
  draft: SetupDraft,
  method: Method | null,
  rule: TestRule,
  house: HouseGeometry | null,
): SetupDraft {
  const media = mediaFor(rule, method);
  const kept = media.find((one) => one === draft.medium);
  const medium = kept ?? (media.length === 1 ? (media[0] ?? null) : null);
  const level = ownLevelFt(method, house);
  return withMedium({ ...draft, method, fillLevelFt: level === null ? '' : oneDecimal(level) }, medium, house);
}

export function withMedium(draft: SetupDraft, medium: Medium | null, house: HouseGeometry | null): SetupDraft {
  const limit = medium === null || house === null ? null : limitAtGauge(medium, house);
  return { ...draft, medium, ceilingPsi: limit === null ? draft.ceilingPsi : String(limit) };
}

/** The rating of the lowest-rated part, less the water standing between it and the gauge; whole psi, never up. */
function limitAtGauge(medium: Medium, house: HouseGeometry): number | null {
  const { lowestRatedPsi, lowestRatedAirPsi, gaugeFt, waterLowestFittingFt } = house;
  if (medium === 'air') return lowestRatedAirPsi ?? lowestRatedPsi;
  if (lowestRatedPsi === null) return null;
  const headFt = gaugeFt === null || waterLowestFittingFt === null ? 0 : Math.max(0, gaugeFt - waterLowestFittingFt);
  return Math.floor(lowestRatedPsi - headPsi(headFt, 60));
}

function oneDecimal(feet: number): string {
  return String(Number(feet.toFixed(1)));
}

export function minimumFor(rule: TestRule, medium: Medium | null): number | null {
  return rule.pressures.find((one) => one.medium === medium)?.minimumPsi ?? null;
}

/** The tools of a draft as the reading needs them; half typed numbers count as not there. */
export function instrumentOfSetup(draft: SetupDraft, rule: TestRule): Instrument {
  const isLevel = draft.medium !== null && isLevelTest({ system: rule.system, medium: draft.medium });
  const increment = positive(isLevel ? draft.incrementIn : draft.incrementPsi);
  return {
    isLevel,
    increment: increment ?? 1,
    rangePsi: isLevel ? null : positive(draft.rangePsi),
    minimumPsi: isLevel ? null : minimumFor(rule, draft.medium),
    ceilingPsi: isLevel ? null : positive(draft.ceilingPsi),
  };
}

function positive(typed: string): number | null {
  const value = parseNumber(typed);
  return value !== null && value > 0 ? value : null;
}

/** What is missing or wrong in a set-up, field by field. */
export function setupFaults(draft: SetupDraft, rule: TestRule): SetupFaults {
  if (draft.method === null) return { method: 'required' };
  if (draft.medium === null) return { medium: 'required' };
  if (isLevelTest({ system: rule.system, medium: draft.medium })) {
    return { ...needed(draft, 'incrementIn', 12), ...levelFault(draft.fillLevelFt) };
  }
  const minimumPsi = minimumFor(rule, draft.medium);
  const range = parseNumber(draft.rangePsi);
  const isShort = range !== null && minimumPsi !== null && range < minimumPsi;
  return {
    ...needed(draft, 'rangePsi', 1000),
    ...(isShort ? { rangePsi: 'gauge-ends-below-minimum' } : {}),
    ...needed(draft, 'incrementPsi', 50),
    ...(draft.ceilingPsi.trim() === '' ? {} : needed(draft, 'ceilingPsi', 1000)),
  };
}

function needed(
  draft: SetupDraft,
  field: 'incrementIn' | 'rangePsi' | 'incrementPsi' | 'ceilingPsi',
  most: number,
): SetupFaults {
  const typed = draft[field];
  if (typed.trim() === '') return { [field]: 'required' };
  const value = parseNumber(typed);
  if (value === null) return { [field]: 'must-be-a-number' };
  if (value <= 0) return { [field]: 'must-be-positive' };
  return value > most ? { [field]: 'out-of-range' } : {};
}

function levelFault(typed: string): SetupFaults {
  if (typed.trim() === '') return { fillLevelFt: 'required' };
  const value = parseNumber(typed);
  if (value === null) return { fillLevelFt: 'must-be-a-number' };
  return value < -40 || value > 300 ? { fillLevelFt: 'out-of-range' } : {};
}

/** The coarsest mark the rule card takes at its minimum, where the gauge's is coarser; null when the gauge will do. */
export function tooCoarse(draft: SetupDraft, rule: TestRule): number | null {
  const minimumPsi = minimumFor(rule, draft.medium);
  const increment = positive(draft.incrementPsi);
  if (minimumPsi === null || increment === null) return null;
  const rows = rule.gaugeIncrements.map((row) =>
    'percent' in row
      ? { upToPsi: null, incrementPsi: null, percent: row.percent }
      : { upToPsi: row.upToPsi, incrementPsi: row.incrementPsi, percent: null },
  );
  const required = requiredIncrementPsi(minimumPsi, rows);
  return increment > required + 1e-9 ? required : null;
}

/** The test as it is sent; only for a set-up without faults. */
export function newHoldOf(
  draft: SetupDraft,
  rule: TestRule,
  part: { unitNumber: number; system: System },
  firstReading: NewHold['firstReading'],
): NewHold {
  const { method, medium } = draft;
  if (method === null || medium === null) throw new Error('a test needs a method and a medium');
  const isLevel = isLevelTest({ system: rule.system, medium });
  const ceilingPsi = positive(draft.ceilingPsi);
  return {
    ...part,
    stageCode: rule.stageCode,
    method,
    medium,
    firstReading,
    ...(isLevel
      ? { tape: { incrementIn: Number(parseNumber(draft.incrementIn)) }, fillLevelFt: parseNumber(draft.fillLevelFt) }
      : {
          gauge: {
            rangePsi: Number(parseNumber(draft.rangePsi)),
            incrementPsi: Number(parseNumber(draft.incrementPsi)),
          },
          ...(ceilingPsi === null ? {} : { ceilingPsi }),
        }),
  };
}
