import { describe, expect, it } from 'vitest';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { asking } from '../testing/fixtures/visits.js';
import { isRetestOf, type LotAsked, refusalOf, unitsOf, unknownUnits } from './request.rules.js';

const content = ruleCardContent();
const [groundwork, roughIn, final] = content.stages as [
  (typeof content.stages)[0],
  (typeof content.stages)[0],
  (typeof content.stages)[0],
];
const lot = (overrides: Partial<LotAsked> = {}): LotAsked => ({
  id: 'a',
  number: '1',
  permitStatus: 'issued',
  unitsAsked: undefined,
  units: [1],
  passedUnits: [],
  openVisitUnits: [],
  failedUnits: [],
  corrections: [],
  ...overrides,
});
const correction = (overrides: Partial<LotAsked['corrections'][0]> = {}) => ({
  lotId: 'a',
  unitNumber: 1,
  stageCode: 'rough-in',
  severity: 'fix-before-cover' as const,
  ...overrides,
});

describe('the units of a request', () => {
  it('are those asked, or all that have not passed', () => {
    expect(unitsOf(lot({ units: [1, 2, 3], passedUnits: [2] }))).toEqual([1, 3]);
    expect(unitsOf(lot({ units: [1, 2, 3], unitsAsked: [3, 1, 3] }))).toEqual([1, 3]);
    expect(unknownUnits(lot({ units: [1, 2], unitsAsked: [2, 5] }))).toEqual([5]);
  });
});

describe('what refuses a request', () => {
  it('nothing, for a lot in order', () => {
    expect(refusalOf([lot()], roughIn, content)).toBeNull();
  });

  it('a permit not issued, only where the rule card needs it', () => {
    const lots = [lot(), lot({ number: '2', permitStatus: 'applied' }), lot({ number: '3', permitStatus: 'expired' })];
    expect(refusalOf(lots, roughIn, content)).toMatchObject({
      code: 'permit-not-issued',
      params: { lots: ['2', '3'] },
    });
    expect(refusalOf(lots, roughIn, ruleCardContent({ asking: asking({ isPermitNeeded: false }) }))).toBeNull();
  });

  it('open corrections of this stage and these units, counted over all lots', () => {
    const lots = [
      lot({ corrections: [correction(), correction()] }),
      lot({ number: '2', corrections: [correction()] }),
    ];
    expect(refusalOf(lots, roughIn, content)).toMatchObject({
      code: 'corrections-open',
      params: { count: 3, lots: ['1', '2'] },
    });
    expect(refusalOf([lot({ corrections: [correction({ stageCode: 'groundwork' })] })], roughIn, content)).toBeNull();
    expect(
      refusalOf([lot({ units: [1, 2], unitsAsked: [2], corrections: [correction()] })], roughIn, content),
    ).toBeNull();
  });

  it('before the last stage also what had to be fixed before final, of whatever stage', () => {
    const corrections = [correction({ severity: 'fix-before-final' })];
    expect(refusalOf([lot({ corrections })], final, content)).toMatchObject({
      code: 'corrections-open',
      params: { count: 1 },
    });
    expect(refusalOf([lot({ corrections: [correction()] })], final, content)).toBeNull();
    expect(refusalOf([lot({ corrections })], groundwork, content)).toBeNull();
  });

  it('a stage that has passed, for all units or for one that is asked for', () => {
    expect(refusalOf([lot({ passedUnits: [1] })], roughIn, content)).toMatchObject({
      code: 'stage-passed',
      params: { lots: ['1'] },
    });
    expect(refusalOf([lot({ units: [1, 2], unitsAsked: [1, 2], passedUnits: [2] })], roughIn, content)?.code).toBe(
      'stage-passed',
    );
    expect(refusalOf([lot({ units: [1, 2], passedUnits: [2] })], roughIn, content)).toBeNull();
  });

  it('a visit that is open on one of the units', () => {
    expect(refusalOf([lot({ openVisitUnits: [1] })], roughIn, content)).toMatchObject({
      code: 'open-visit-exists',
      params: { lots: ['1'] },
    });
    expect(refusalOf([lot({ units: [1, 2], unitsAsked: [2], openVisitUnits: [1] })], roughIn, content)).toBeNull();
  });

  it('tells the permit before corrections, corrections before the rest', () => {
    const all = lot({
      permitStatus: 'applied',
      corrections: [correction()],
      passedUnits: [1],
      openVisitUnits: [1],
      unitsAsked: [1],
    });
    expect(refusalOf([all], roughIn, content)?.code).toBe('permit-not-issued');
    expect(refusalOf([{ ...all, permitStatus: 'issued' }], roughIn, content)?.code).toBe('corrections-open');
    expect(refusalOf([{ ...all, permitStatus: 'issued', corrections: [] }], roughIn, content)?.code).toBe(
      'stage-passed',
    );
  });
});

describe('a re-test', () => {
  it('is a request on a unit whose visit of this stage failed', () => {
    expect(isRetestOf(lot())).toBe(false);
    expect(isRetestOf(lot({ failedUnits: [1] }))).toBe(true);
    expect(isRetestOf(lot({ units: [1, 2], unitsAsked: [2], failedUnits: [1] }))).toBe(false);
  });
});
