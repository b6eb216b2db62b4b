import { describe, expect, it } from 'vitest';
import { analyseLevels, analyseRows, type Row, type WaterHoldGiven } from './hold.sample.js';

// Shutting the gauge valve while waiting and watching whether the needle jumps: common practice, no published source.
describe('what shutting the gauge valve shows', () => {
  it.each<[string | null, string, Row[], Partial<WaterHoldGiven>]>([
    [
      null,
      'never shut',
      [
        [0, 120],
        [1, 120],
      ],
      {},
    ],
    [
      null,
      'shut before it was ever open',
      [
        [0, 120, 68, 'shut'],
        [1, 120],
      ],
      {},
    ],
    [
      'gauge-sound',
      'the shut gauge stays',
      [
        [0, 120],
        [1, 119, 68, 'shut'],
      ],
      {},
    ],
    [
      'open-the-valve-to-know',
      'it fell and nobody opened the valve',
      [
        [0, 120],
        [1, 110, 68, 'shut'],
      ],
      {},
    ],
    [
      'gauge-leaks-system-held',
      'the needle jumps back',
      [
        [0, 120],
        [1, 100, 68, 'shut'],
        [2, 119],
      ],
      {},
    ],
    [
      'gauge-leaks-system-held',
      'it comes back higher',
      [
        [0, 120],
        [1, 100, 68, 'shut'],
        [2, 121],
      ],
      {},
    ],
    [
      'system-dropped',
      'it comes back lower',
      [
        [0, 120],
        [1, 100, 68, 'shut'],
        [2, 118],
      ],
      {},
    ],
    [
      'gauge-leaks-system-held',
      'the last of several shut readings counts',
      [
        [0, 120],
        [1, 90, 68, 'shut'],
        [2, 110, 68, 'shut'],
        [3, 120],
      ],
      {},
    ],
    [
      'gauge-sound',
      'a dip that came back before opening',
      [
        [0, 120],
        [1, 90, 68, 'shut'],
        [2, 119.5, 68, 'shut'],
        [3, 118],
      ],
      {},
    ],
    [
      'gauge-sound',
      'a cold night in air',
      [
        [0, 100, 70],
        [9, 97.83, 60, 'shut'],
      ],
      { medium: 'air', minimumPsi: 90 },
    ],
    [
      'gauge-sound',
      'a cold night over water, in doubt',
      [
        [0, 100, 70],
        [9, 97.83, 60, 'shut'],
      ],
      { medium: 'water-topped-with-air', minimumPsi: 90 },
    ],
    [
      'open-the-valve-to-know',
      'the same fall in water',
      [
        [0, 100, 70],
        [9, 97.83, 60, 'shut'],
      ],
      { minimumPsi: 90 },
    ],
    [
      'gauge-leaks-system-held',
      'air came back as cold as it should',
      [
        [0, 100, 70],
        [8, 60, 60, 'shut'],
        [9, 97.83, 60],
      ],
      { medium: 'air', minimumPsi: 90 },
    ],
    [
      'system-dropped',
      'air came back lower than the cold explains',
      [
        [0, 100, 70],
        [8, 60, 60, 'shut'],
        [9, 96, 60],
      ],
      { medium: 'air', minimumPsi: 90 },
    ],
    [
      'open-the-valve-to-know',
      'a reading of the settle time counts as open',
      [
        [0, 120],
        [0.2, 110, 68, 'shut'],
      ],
      { settleMinutes: 60 },
    ],
  ])('%s: %s', (finding, _, rows, changes) => {
    expect(analyseRows(rows, changes).gaugeFinding).toBe(finding);
  });

  it('answers the worst of several runs', () => {
    const held: Row[] = [
      [0, 120],
      [1, 100, 68, 'shut'],
      [2, 120],
    ];
    expect(analyseRows([...held, [3, 120, 68, 'shut']]).gaugeFinding).toBe('gauge-leaks-system-held');
    expect(analyseRows([...held, [3, 100, 68, 'shut']]).gaugeFinding).toBe('open-the-valve-to-know');
    expect(analyseRows([...held, [3, 100, 68, 'shut'], [4, 117], [5, 100, 68, 'shut']]).gaugeFinding).toBe(
      'system-dropped',
    );
  });

  it('forgets what was before the last pump-up', () => {
    expect(
      analyseRows([
        [0, 120],
        [1, 100, 68, 'shut'],
        [2, 110],
        [3, 125],
      ]).gaugeFinding,
    ).toBeNull();
  });

  it('has nothing to say of a level', () => {
    expect(
      analyseLevels([
        [0, 0],
        [1, 0],
      ]).gaugeFinding,
    ).toBeNull();
  });
});
