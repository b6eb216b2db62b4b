import type { DemoCorrection, DemoVisitPlan } from './demo-visit-story.js';

export const drip: DemoCorrection = {
  subject: 'dwv',
  text: 'Drip at the shower tee, low side',
  severity: 'fix-before-cover',
  place: { x: 0.72, y: 0.5 },
  floor: 'second',
  room: 'bath wall',
  section: '7-204',
};
export const nailPlate: DemoCorrection = {
  subject: 'work',
  pointCode: 'nail-plates',
  text: 'No nail plate at the stack',
  severity: 'fix-before-cover',
  place: { x: 0.6, y: 0.42 },
  floor: 'second',
  room: 'bath wall',
  section: '5-118',
};
export const hanger: DemoCorrection = {
  ...nailPlate,
  pointCode: 'hangers',
  text: 'Hanger missing on the laundry branch',
  section: '5-131',
  place: { x: 0.4, y: 0.55 },
};

const pass = { kind: 'pass' as const };
export const fail = (...corrections: DemoCorrection[]) => ({ kind: 'fail' as const, corrections });

export const groundwork = (day: number, window = 'early', more: Partial<DemoVisitPlan> = {}): DemoVisitPlan => ({
  stage: 'groundwork',
  day,
  window,
  systems: ['dwv'],
  method: 'stack-to-roof',
  levelFt: 10,
  up: 'all',
  result: pass,
  ...more,
});
export const rough = (day: number, window: string, more: Partial<DemoVisitPlan> = {}): DemoVisitPlan => ({
  stage: 'rough-in',
  day,
  window,
  systems: ['dwv', 'water'],
  method: 'stack-to-roof',
  levelFt: 24.5,
  psi: [118, 116],
  up: 'all',
  result: pass,
  ...more,
});
export const attic = { method: 'attic-cut' as const, levelFt: 21 };
