import { route } from '../common/route.js';
import { dialInput, dialReading } from './dial.contract.js';
import { dwvPlan, dwvPlanInput } from './dwv-plan.contract.js';
import { holdAnalysis, holdInput } from './hold.contract.js';
import { waterPlan, waterPlanInput } from './water-plan.contract.js';

/** Previews of what the app computes, open to any signed-in person; they keep nothing and need no idempotency key. */
export const calcRoutes = {
  dwvPlan: route({
    method: 'POST',
    path: '/api/calc/dwv-plan',
    summary: 'Plan a DWV test',
    status: 200,
    body: dwvPlanInput,
    answer: dwvPlan,
  }),
  waterPlan: route({
    method: 'POST',
    path: '/api/calc/water-plan',
    summary: 'Plan a water test',
    status: 200,
    body: waterPlanInput,
    answer: waterPlan,
  }),
  hold: route({
    method: 'POST',
    path: '/api/calc/hold',
    summary: 'Analyse a test log and forecast it',
    status: 200,
    body: holdInput,
    answer: holdAnalysis,
  }),
  dial: route({
    method: 'POST',
    path: '/api/calc/dial',
    summary: 'Read a gauge from points on its photo',
    status: 200,
    body: dialInput,
    answer: dialReading,
  }),
};
