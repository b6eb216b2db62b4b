import { describe, expect, it } from 'vitest';
import { planTools } from '@holdwater/shared-types/plans/plan-tools.js';
import { planWays } from '@holdwater/shared-types/plans/plan-ways.js';
import type { PlanWay } from '@holdwater/shared-types/plans/plan.contract.js';
import { demoHouses, type DemoHouse } from '../database/demo/demo-houses.js';
import { demoDepartments } from '../database/demo/demo-rule-cards.js';

const onHoldwater = demoDepartments.filter(({ isOutside }) => !isOutside);
const tools = planTools.parse({ fillRateGpm: 6 });

function waysAt(key: string, house: DemoHouse, system: 'dwv' | 'water'): PlanWay[] {
  const department = onHoldwater.find((each) => each.key === key);
  const rule = department?.ruleCard?.content.tests.find(
    (each) => each.system === system && each.stageCode.startsWith('rough'),
  );
  if (department === undefined || rule === undefined) throw new Error(`no rule of ${key}`);
  const { elevationFt } = department;
  return planWays({ house: demoHouses[house], rule, isGroundwork: false, tools, elevationFt });
}

const offered = (ways: PlanWay[]): string[] => ways.filter(({ isOffered }) => isOffered).map(({ method }) => method);

describe('the three demo departments', () => {
  it('give three different plans for the same house', () => {
    const plans = onHoldwater.map(({ key }) =>
      JSON.stringify({
        dwv: waysAt(key, 'twoFloorsLaundryUp', 'dwv'),
        water: waysAt(key, 'twoFloorsLaundryUp', 'water'),
      }),
    );
    expect(onHoldwater).toHaveLength(3);
    expect(new Set(plans).size).toBe(3);
  });

  it('offer drains different ways, and ask different levels of the same way', () => {
    expect(offered(waysAt('tallowmere', 'twoFloorsLaundryUp', 'dwv'))).toEqual([
      'stack-to-roof',
      'attic-cut',
      'laundry-box',
    ]);
    expect(offered(waysAt('vennick', 'twoFloorsLaundryUp', 'dwv'))).toEqual(['stack-to-roof', 'sectional']);
    expect(offered(waysAt('ashquill', 'twoFloorsLaundryUp', 'dwv'))).toEqual(['stack-to-roof']);
    const required = onHoldwater.map(
      ({ key }) =>
        waysAt(key, 'twoFloorsLaundryUp', 'dwv').find(({ method }) => method === 'stack-to-roof')?.dwv?.requiredLevelFt,
    );
    // the vent terminal itself; 10 ft over 13.5; 5 ft over 13.5
    expect(required).toEqual([24.5, 23.5, 18.5]);
  });

  it('ask different pressures of the lines of the same house', () => {
    const targets = onHoldwater.map(({ key }) => {
      const [water] = waysAt(key, 'twoFloorsLaundryDown', 'water');
      return [water?.water?.floorPsi, water?.water?.targetPsi, water?.isOffered];
    });
    // rated 150: less the head of 5 ft the ceiling is 147, so 150 at the gauge is over the lowest-rated part
    expect(targets).toEqual([
      [100, 120, true],
      [150, 160, false],
      [80, 80, true],
    ]);
  });

  it.each(Object.keys(demoHouses) as DemoHouse[])('leave no way of %s unexplained', (house) => {
    for (const { key } of onHoldwater) {
      for (const way of [...waysAt(key, house, 'dwv'), ...waysAt(key, house, 'water')]) {
        expect(way.isOffered || way.reasons.length + way.missing.length > 0).toBe(true);
      }
      expect(offered(waysAt(key, house, 'dwv')).length).toBeGreaterThan(0);
    }
  });
});
