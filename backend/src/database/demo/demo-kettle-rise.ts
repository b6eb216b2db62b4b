import type { DemoLot } from './demo-lots.js';
import { attic, fail, groundwork, hanger, rough } from './demo-visit-plans.js';
import type { DemoVisitPlan } from './demo-visit-story.js';

const plumbers = ['ruben', 'sunniva', 'ida'] as const;

const kettle = (number: number, visits: DemoVisitPlan[], more: Partial<DemoLot> = {}): DemoLot => ({
  number: String(number),
  address: `${200 + number} Kettle Rise`,
  house: number % 4 === 0 ? 'slab' : 'twoFloorsLaundryUp',
  plumber: plumbers[number % 3] ?? 'ruben',
  permit: 'issued',
  gateCode: '2290',
  visits: [groundwork(number - 77, 'morning'), ...visits],
  ...more,
});
const coming = (day: number, window: string, inspector: string, more: Partial<DemoVisitPlan> = {}) =>
  rough(day, window, { ...attic, up: 'early', result: undefined, inspector, ...more });

/** Kettle Rise: Penmarrow Builders under Tallowmere; what fills the days of today and tomorrow for its inspectors and its desk. */
export const kettleRiseLots: readonly DemoLot[] = [
  kettle(31, [coming(0, 'midday', 'noor')]),
  kettle(32, [coming(0, 'early', 'gil', { result: { kind: 'pass' } })]),
  kettle(33, [coming(0, 'morning', 'gil', { result: fail(hanger) })]),
  kettle(34, [coming(0, 'midday', 'gil')]),
  kettle(35, [coming(0, 'afternoon', 'ines')]),
  kettle(36, [coming(0, 'afternoon', 'noor')]),
  kettle(37, [coming(1, 'early', 'gil')]),
  kettle(38, [coming(1, 'morning', 'ines')]),
  kettle(39, [coming(1, 'midday', 'bo')]),
  kettle(40, [coming(1, 'afternoon', 'noor', { up: 'none' })]),
  kettle(41, [coming(1, 'midday', 'gil', { up: 'dwv' })]),
  kettle(42, [coming(1, 'midday', 'noor')]),
  kettle(43, [coming(2, 'morning', 'ines', { up: 'none' })]),
  kettle(44, []),
];
