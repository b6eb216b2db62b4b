import { type DwvRequest } from './dwv.input.js';
import { type secondDwvPlan } from './dwv.js';
import { isAbove } from './physics.js';

/** What the table of cautions pins for a DWV plan: codes that must be there, and codes that must not. */
export function dwvCautions(given: DwvRequest, plan: ReturnType<typeof secondDwvPlan>) {
  const { method } = given;
  const fill = plan.fillLevelFt;
  const isFilled = method !== 'air';
  const rules: Record<string, boolean> = {
    'local-code': true,
    'compressed-air': !isFilled,
    backflow: isFilled,
    'plug-stand-aside': plan.plugs.length > 0,
    'plug-load': plan.plugs.some(({ loadFraction }) => isAbove(loadFraction, 0.8)),
    'floors-not-under-test': fill !== null && (given.floors ?? []).some((floor) => isAbove(floor.elevationFt, fill)),
    attic: method === 'attic-cut',
    roof: method === 'stack-to-roof',
    ladder: method === 'stack-to-roof',
    trench: method === 'standpipe',
    // those of logs, forecasts and water lines
    'over-ceiling': false,
    'shut-gauge': false,
    freeze: false,
    'freeze-risk': false,
    'sealed-water-warms': false,
    'water-temperature': false,
    'air-dissolves': false,
    'temperature-missing': false,
    'one-reading': false,
    'many-top-ups': false,
    'cement-cure': false,
  };
  // with air there is no water to go anywhere; the table's "DWV" can be read either way
  if (isFilled) rules.discharge = true;
  return rules;
}
