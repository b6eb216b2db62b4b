import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import type { DemoHouse } from './demo-houses.js';
import { attic, drip, fail, groundwork, hanger, nailPlate, rough } from './demo-visit-plans.js';
import type { DemoVisitPlan } from './demo-visit-story.js';

export interface DemoLot {
  number: string;
  address: string;
  house: DemoHouse;
  plumber: string;
  permit: 'issued' | 'applied';
  units?: number;
  gateCode?: string;
  hazards?: string;
  visits: DemoVisitPlan[];
  /** A test left standing without a window, this many working days ago. */
  standing?: { system: 'dwv'; method: DwvMethod; day: number };
}

const noors = { inspector: 'noor' };

const sorrel = (number: number, house: DemoHouse, visits: DemoVisitPlan[], more: Partial<DemoLot> = {}): DemoLot => ({
  number: String(number),
  address: `${number <= 11 || number >= 23 ? 100 + number * 6 : 380 + number * 2} ${number <= 11 || number >= 23 ? 'Teasel Way' : 'Sedge Loop'}`,
  house,
  plumber: [5, 11, 14, 21, 24].includes(number) ? 'sunniva' : 'ruben',
  permit: 'issued',
  gateCode: '4417',
  visits,
  ...more,
});

/** Sorrel Bench: Odderly Homes under Tallowmere, a lot in every state there is. */
export const sorrelBenchLots: readonly DemoLot[] = [
  sorrel(1, 'twoFloorsLaundryUp', [groundwork(-46), rough(-26, 'morning')]),
  sorrel(2, 'twoFloorsLaundryUp', [groundwork(-45), rough(-25, 'morning')]),
  sorrel(3, 'slab', [groundwork(-44), rough(-24, 'midday')]),
  sorrel(4, 'twoFloorsLaundryDown', [
    groundwork(-43),
    rough(-23, 'morning', { result: fail(drip) }),
    rough(-19, 'morning', { fixesBefore: 1 }),
  ]),
  sorrel(5, 'twoFloorsLaundryUp', [groundwork(-42), rough(-6, 'midday', attic)]),
  sorrel(6, 'twoFloorsLaundryUp', [groundwork(-30), rough(1, 'afternoon', { up: 'none', result: undefined })]),
  sorrel(7, 'twoFloorsLaundryUp', [groundwork(-41), rough(-22, 'afternoon')]),
  sorrel(8, 'threeFloors', [groundwork(-40), rough(-21, 'morning', { levelFt: 34 })]),
  sorrel(9, 'twoFloorsLaundryUp', [groundwork(-28), rough(1, 'early', { up: 'early', result: undefined, ...noors })]),
  sorrel(10, 'twoFloorsLaundryUp', [
    groundwork(-39),
    rough(-20, 'midday', { result: fail(nailPlate, hanger) }),
    rough(-15, 'early', { fixesBefore: 1 }),
  ]),
  sorrel(11, 'twoFloorsLaundryUp', [groundwork(-38), rough(-3, 'early', attic)]),
  sorrel(12, 'twoFloorsLaundryUp', [groundwork(-37), rough(-2, 'early', { ...attic, ...noors })]),
  sorrel(13, 'twoFloorsLaundryDown', [
    groundwork(-36),
    rough(-17, 'morning', { result: { kind: 'not-ready', reason: 'not-up' }, up: 'none' }),
    rough(-14, 'morning'),
  ]),
  sorrel(14, 'twoFloorsLaundryUp', [
    groundwork(-35),
    rough(-1, 'afternoon', { result: fail(drip, nailPlate), ...attic }),
  ]),
  sorrel(15, 'twoFloorsLaundryUp', [groundwork(-34), rough(-16, 'afternoon')]),
  sorrel(16, 'twoFloorsLaundryUp', [groundwork(-33), rough(0, 'afternoon', { ...attic, ...noors, result: undefined })]),
  sorrel(
    17,
    'twoFloorsLaundryUp',
    [
      groundwork(-32),
      rough(-4, 'morning', {
        result: fail({ ...drip, text: 'Drip at the laundry tee', room: 'laundry branch' }),
        ...attic,
        ...noors,
      }),
      rough(1, 'morning', { ...attic, up: 'dwv', result: undefined, fixesBefore: 1, ...noors }),
    ],
    { hazards: 'Open stairwell on the second floor' },
  ),
  sorrel(18, 'twoFloorsLaundryUp', [groundwork(-27)], { standing: { system: 'dwv', method: 'attic-cut', day: -1 } }),
  sorrel(19, 'twoFloorsLaundryUp', [], { permit: 'applied' }),
  sorrel(20, 'twoFloorsLaundryUp', [
    groundwork(-25),
    rough(-1, 'midday', { up: 'none', result: { kind: 'not-ready', reason: 'not-up' } }),
  ]),
  sorrel(21, 'twoFloorsLaundryUp', [groundwork(-24), rough(-5, 'morning', { result: fail(hanger) })]),
  sorrel(22, 'twoFloorsLaundryUp', [groundwork(-23), rough(0, 'morning', { ...attic, ...noors, result: undefined })]),
  sorrel(23, 'slab', [groundwork(-22)], { standing: { system: 'dwv', method: 'attic-cut', day: -1 } }),
  sorrel(24, 'crawlSpace', [
    groundwork(-21),
    rough(-7, 'early', {
      result: fail({ ...nailPlate, text: 'No nail plate, kitchen wall', floor: 'first', room: 'kitchen' }),
    }),
  ]),
  sorrel(25, 'twoFloorsLaundryUp', [groundwork(-18), rough(2, 'morning', { up: 'none', result: undefined })]),
  sorrel(26, 'twoFloorsLaundryUp', [
    groundwork(-13),
    rough(-8, 'morning', { up: 'none', ends: { kind: 'withdrawn', why: 'Rain since noon' } }),
  ]),
  sorrel(27, 'slab', [groundwork(0, 'early', noors)]),
  sorrel(28, 'twoFloorsLaundryUp', [groundwork(-9, 'early', { result: { kind: 'no-access', reason: 'locked' } })]),
];

const vennickRough = (day: number, window: string, more: Partial<DemoVisitPlan> = {}) =>
  rough(day, window, { psi: [164, 162], ...more });
/** Vennick wants a standpipe on groundwork. */
const slab = (day: number, window: string, more: Partial<DemoVisitPlan> = {}) =>
  groundwork(day, window, { method: 'standpipe', ...more });
const mill = (number: number, visits: DemoVisitPlan[], more: Partial<DemoLot> = {}): DemoLot => ({
  number: String(number),
  address: `${10 + number} Rushlight Street`,
  house: 'twoFloorsLaundryDown',
  plumber: number % 2 === 0 ? 'sunniva' : 'ida',
  permit: 'issued',
  visits,
  ...more,
});

/** Millpond: Penmarrow Builders under Vennick County, whose desk places every request. */
export const millpondLots: readonly DemoLot[] = [
  mill(51, [slab(-40, 'morning'), vennickRough(-12, 'morning')]),
  mill(52, [slab(-38, 'afternoon'), vennickRough(1, 'morning', { up: 'early', result: undefined })]),
  mill(53, [
    slab(-36, 'morning'),
    vennickRough(-10, 'afternoon', { result: fail(drip, hanger) }),
    vennickRough(-4, 'morning', { fixesBefore: 2 }),
  ]),
  mill(54, [slab(-34, 'morning'), vennickRough(0, 'morning', { result: undefined })]),
  mill(55, [slab(-32, 'morning'), vennickRough(2, 'morning', { isUnplaced: true, up: 'none', result: undefined })]),
  mill(56, [slab(-30, 'afternoon'), vennickRough(2, 'afternoon', { isUnplaced: true, up: 'none', result: undefined })]),
  mill(57, [
    slab(-28, 'morning'),
    vennickRough(-3, 'morning', { up: 'none', ends: { kind: 'declined', why: 'Framing is not passed yet' } }),
  ]),
  mill(58, [slab(-26, 'morning')]),
  mill(59, [slab(-6, 'morning')]),
  mill(60, [slab(2, 'morning', { isUnplaced: true, up: 'none', result: undefined })]),
  mill(61, []),
  mill(62, [], { permit: 'applied' }),
];

const ashRough = (day: number, window: string, more: Partial<DemoVisitPlan> = {}): DemoVisitPlan => ({
  ...rough(day, window, more),
  stage: 'rough',
  method: more.method ?? 'laundry-riser',
  levelFt: 2.4,
  psi: [92, 91],
});
const underSlab = (day: number) => groundwork(day, 'am', { stage: 'under-slab', method: 'standpipe' });
const street = (number: string, address: string, visits: DemoVisitPlan[], more: Partial<DemoLot> = {}): DemoLot => ({
  number,
  address,
  house: 'twoFloorsLaundryDown',
  plumber: 'anselm',
  permit: 'issued',
  visits,
  ...more,
});

/** Single houses of Odderly Homes under Ashquill, in another zone; one of them a house of two units. */
export const ashquillLots: readonly DemoLot[] = [
  street('88', '88 Fennel Street', [underSlab(-20), ashRough(-2, 'am')]),
  street('41', '41 Fennel Street', [underSlab(-15), ashRough(1, 'am', { up: 'early', result: undefined })]),
  street('2207', '2207 Bracken Road', [underSlab(-12)], { units: 2 }),
];

/** A house under a department that is not on Holdwater. */
export const corrowLots: readonly DemoLot[] = [street('7', '7 Hob Gate', [])];
