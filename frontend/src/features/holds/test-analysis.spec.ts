import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { describe, expect, it } from 'vitest';
import { analyseTest, isPlasticSystem, pressureInputOf, type TestAnalysis } from './test-analysis';
import { atHour, storyTerms, storyTest } from './testing/told-stories';

function analysed(...given: Parameters<typeof analyseTest>): TestAnalysis {
  const found = analyseTest(...given);
  if (found === null) throw new Error('nothing to work out');
  return found;
}

describe('a test as the computation sees it', () => {
  const air = { medium: 'air', ceilingPsi: null, minimumPsi: 40, gauge: { rangePsi: 100, incrementPsi: 1 } } as const;
  const denver = storyTerms({ elevationFt: 5000 }, 60);

  it('expects of 50 psi of air at 70 °F, 12.228 psia of atmosphere, 48.8252 psi at 60 °F', () => {
    // check-values.md, section 2: "air, 50 psig 70→60, sea level / 12.228 psia: 48.7786 / 48.8252", computed from exact definitions
    const { forecast, patmPsi } = analysed(storyTest([[17, 50, 70]], air), denver);
    // the standard atmosphere at 5000 ft, psychrolib by check-values.md: 12.2278
    expect(patmPsi).toBeCloseTo(12.2278, 2);
    expect(forecast?.from.mid).toBeCloseTo(48.8252, 2);
  });

  it('expects of 100 psi of air at 70 °F at sea level 97.8346 psi at 60 °F', () => {
    // check-values.md, section 2: "air, 100 psig 70→60: 97.8346", computed from exact definitions
    const { forecast } = analysed(storyTest([[17, 100, 70]], air), storyTerms({ elevationFt: 0 }, 60));
    expect(forecast?.from.mid).toBeCloseTo(97.8346, 3);
  });

  it('leaves out struck readings and takes the later of two at one instant', () => {
    const test = storyTest(
      [
        [17, 120, 60],
        [18, 90, 60],
        [19, 118, 60],
      ],
      { minimumPsi: 100 },
    );
    const [first, wrong, last] = test.readings;
    const readings = [
      { ...last!, receivedAt: atHour(21), pressurePsi: 119 },
      { ...last!, receivedAt: atHour(20) },
      { ...wrong!, isStruck: true },
      first!,
    ];
    expect(pressureInputOf({ ...test, readings }, denver).readings.map(({ psi }) => psi)).toEqual([120, 119]);
  });

  it('does not count settling where no pipe is plastic, nor judges a test nobody read', () => {
    const test = storyTest([
      [17, 120, 60],
      [17.5, 119.5, 60],
    ]);
    expect(analysed(test, storyTerms()).verdict).toBe('holding');
    expect(analysed(test, storyTerms({ isPlastic: true })).verdict).toBe('settling');
    expect(analyseTest({ ...test, readings: [] }, storyTerms())).toBeNull();
  });

  it('has no forecast without a window, nor of a level', () => {
    expect(analysed(storyTest([[17, 120, 60]]), storyTerms({ forecast: null })).forecast).toBeNull();
    const level = storyTest(
      [
        [17, 0, null],
        [20, 0, null],
      ],
      { system: 'dwv', gauge: null, tape: { incrementIn: 0.25 } },
    );
    const readings = level.readings.map((one) => ({ ...one, pressurePsi: null, levelIn: 1, gaugeValve: null }));
    const found = analysed({ ...level, readings }, storyTerms());
    expect([found.forecast, found.verdict, found.isLevel]).toEqual([null, 'holding', true]);
  });

  it('takes pipes nobody told of for plastic ones', () => {
    const house = houseGeometry.parse({ pipeMaterial: 'cast-iron', waterPipeMaterials: ['copper', 'pex'] });
    expect([isPlasticSystem(null, 'water'), isPlasticSystem(house, 'water'), isPlasticSystem(house, 'dwv')]).toEqual([
      true,
      true,
      false,
    ]);
  });
});
