import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import type { PlanTools } from '@holdwater/shared-types/plans/plan-tools.js';
import type { PlanWay } from '@holdwater/shared-types/plans/plan.contract.js';

/** The steps of putting a test up, in the order the trade takes them (common practice, no published source). */
export const stepCodes = [
  'cap-openings',
  'set-plugs',
  'cap-vents',
  'fill-from-roof',
  'cut-vent',
  'open-knockout',
  'stand-riser',
  'stand-standpipe',
  'fill-lifts',
  'fill-to',
  'look-at-joints',
  'mark-level',
  'pump-air',
  'soap-joints',
  'isolate',
  'set-gauge',
  'fill-and-bleed',
  'shut-main',
  'top-with-air',
  'air-in-lines',
  'pump-to',
  'settle',
  'shut-gauge-valve',
  'hang-tag',
] as const;
export type StepCode = (typeof stepCodes)[number];

/** A step and the numbers its words need: psi, feet above the first floor, a count. */
export interface PlanStep {
  readonly code: StepCode;
  readonly psi?: number;
  readonly levelFt?: number;
  readonly count?: number;
  readonly minutes?: number;
}

export interface StepsInput {
  readonly way: Pick<PlanWay, 'method' | 'medium' | 'dwv' | 'water'>;
  readonly tools: Pick<PlanTools, 'gauge'>;
  readonly cappedVents: number;
  readonly settleMinutes: number;
}

/** What the plumber does, one step after the other; empty where nothing is worked out. */
export function planSteps(input: StepsInput): PlanStep[] {
  const { way } = input;
  if (way.water !== null) return waterSteps(input);
  return way.dwv === null || way.method === 'gauge' ? [] : dwvSteps(input, way.method);
}

const placeSteps: Readonly<Partial<Record<DwvMethod, StepCode>>> = {
  'stack-to-roof': 'fill-from-roof',
  'attic-cut': 'cut-vent',
  'laundry-box': 'open-knockout',
  'laundry-riser': 'stand-riser',
  standpipe: 'stand-standpipe',
};

function dwvSteps({ way, cappedVents }: StepsInput, method: DwvMethod): PlanStep[] {
  const { dwv } = way;
  const place = placeSteps[method];
  const levelFt = dwv?.fillLevelFt ?? undefined;
  const plugCount = dwv?.plugs.length ?? 0;
  const begin: PlanStep[] = [
    { code: 'cap-openings' },
    ...(plugCount > 0 ? [{ code: 'set-plugs', count: plugCount } as const] : []),
    ...(cappedVents > 0 ? [{ code: 'cap-vents', count: cappedVents } as const] : []),
  ];
  if (method === 'air') {
    const psi = dwv?.air?.pressurePsi;
    return [...begin, { code: 'pump-air', psi }, { code: 'soap-joints' }, { code: 'hang-tag' }];
  }
  const lifts = dwv?.lifts?.length ?? 0;
  const fill: PlanStep = lifts > 1 ? { code: 'fill-lifts', count: lifts } : { code: 'fill-to', levelFt };
  return [
    ...begin,
    ...(place === undefined ? [] : [{ code: place }]),
    fill,
    { code: 'look-at-joints' },
    { code: 'mark-level' },
    { code: 'hang-tag' },
  ];
}

function waterSteps({ way, settleMinutes }: StepsInput): PlanStep[] {
  const { water, medium } = way;
  const psi = water?.targetPsi;
  return [
    { code: 'isolate' },
    { code: 'set-gauge' },
    ...(medium === 'air' ? [{ code: 'air-in-lines' } as const] : [{ code: 'fill-and-bleed' } as const]),
    ...(water?.needsTopUp === false ? [] : [{ code: 'shut-main' } as const]),
    ...(medium === 'water-topped-with-air' ? [{ code: 'top-with-air' } as const] : []),
    { code: 'pump-to', psi },
    ...(settleMinutes > 0 ? [{ code: 'settle', minutes: settleMinutes, psi } as const] : []),
    { code: 'shut-gauge-valve' },
    { code: 'hang-tag' },
  ];
}
