import type { DwvRequest } from './dwv.input.js';

export interface Lift {
  fromFt: number;
  toFt: number;
  headFt: number;
}

/** Where the water stands and where it must stand, ft; both null with air. */
export function dwvLevelOf(given: DwvRequest): { fill: number | null; required: number | null } {
  const fill = fillOf(given);
  if (fill === null) return { fill, required: null };
  const { headRule } = given.rule;
  if (given.method === 'sectional' || headRule.kind === 'fill-level') return { fill, required: fill };
  return { fill, required: Math.min(given.ventTerminalFt, given.highestFittingFt + headRule.feet) };
}

function fillOf({ method, ...given }: DwvRequest): number | null {
  switch (method) {
    case 'air':
      return null;
    case 'stack-to-roof':
    case 'sectional':
      return given.ventTerminalFt;
    case 'attic-cut':
      return needed(given.atticCutFt);
    case 'standpipe':
      return needed(given.standpipeFt);
    case 'laundry-box':
      return needed(given.laundry?.boxOutletFt);
    case 'laundry-riser':
      return needed(given.laundry?.branchFt) + (given.riserIn ?? 18) / 12;
  }
}

/** Each as high as allowed and lapping `feet` over the one before, until the vent terminal is reached. */
export function liftsOf(given: DwvRequest): Lift[] {
  const { headRule } = given.rule;
  const lap = headRule.kind === 'above-highest-fitting' ? headRule.feet : 10;
  const lifts: Lift[] = [];
  let fromFt = given.lowestFittingFt;
  for (;;) {
    const toFt = Math.min(fromFt + needed(given.maxSectionFt), given.ventTerminalFt);
    lifts.push({ fromFt, toFt, headFt: toFt - fromFt });
    if (toFt >= given.ventTerminalFt - 1e-9) return lifts;
    fromFt = toFt - lap;
  }
}

function needed(value: number | null | undefined): number {
  if (value == null) throw new Error('the request lacks what its method uses');
  return value;
}
