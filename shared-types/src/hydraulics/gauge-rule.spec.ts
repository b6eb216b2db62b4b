import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gaugeIncrementRow, gaugeIncrements, requiredIncrementPsi } from './gauge-rule.js';
import { convertPressure } from './units.js';

describe('the model code’s gauge table', () => {
  // IRC P2503.9 and a municipal text: ≤ 10 psi 0.10, > 10 to ≤ 100 psi 1, > 100 psi 2 % of the test pressure
  it.each([
    [5, 0.1],
    [10, 0.1],
    [10.01, 1],
    [50, 1],
    [100, 1],
    [100.5, 2.01],
    [150, 3],
    [200, 4],
  ])('a test at %d psi wants steps of %d psi or finer', (testPsi, increment) => {
    expect(requiredIncrementPsi(testPsi, null)).toBeCloseTo(increment, 12);
    expect(requiredIncrementPsi(testPsi, [])).toBeCloseTo(increment, 12);
  });

  it('puts ten feet of water into the finest class', () => {
    expect(requiredIncrementPsi(convertPressure(10, 'ftH2O', 'psi'), null)).toBe(0.1); // 4.335 psi, NIST SP 811
  });
});

describe('a department’s own table', () => {
  const rows = (given: unknown) => gaugeIncrements.parse(given);

  it('replaces the model one, the first row that reaches wins', () => {
    const own = rows([{ upToPsi: 10, incrementPsi: 0.1 }, { upToPsi: 100, incrementPsi: 1 }, { incrementPsi: 2 }]);
    expect([10, 60, 150].map((psi) => requiredIncrementPsi(psi, own))).toEqual([0.1, 1, 2]); // an older text: 2 psi above 100
    expect(requiredIncrementPsi(60, rows([{ upToPsi: 10, incrementPsi: 0.1 }, { percent: 2 }]))).toBeCloseTo(1.2, 12);
  });

  it('falls back on its last row where none reaches', () => {
    expect(
      requiredIncrementPsi(
        60,
        rows([
          { upToPsi: 10, incrementPsi: 0.1 },
          { upToPsi: 50, incrementPsi: 0.5 },
        ]),
      ),
    ).toBe(0.5);
  });

  it('wants an increment or a percentage in every row, not both, not zero', () => {
    expect(gaugeIncrementRow.safeParse({ upToPsi: 10 }).error?.issues[0]?.message).toBe('increment-or-percent');
    expect(gaugeIncrementRow.safeParse({ incrementPsi: 1, percent: 2 }).error?.issues[0]?.message).toBe(
      'increment-or-percent',
    );
    expect(gaugeIncrementRow.safeParse({ percent: 0 }).error?.issues[0]?.message).toBe('must-be-positive');
  });

  it('never asks for a finer step at a higher pressure within the model code', () => {
    const psi = fc.double({ min: 0.1, max: 400, noNaN: true });
    fc.assert(
      fc.property(psi, psi, (a, b) => {
        const [atLower, atHigher] = [Math.min(a, b), Math.max(a, b)].map((value) => requiredIncrementPsi(value, null));
        expect(atHigher).toBeGreaterThanOrEqual(atLower ?? Infinity);
      }),
    );
  });
});
