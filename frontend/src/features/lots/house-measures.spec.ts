import { describe, expect, it } from 'vitest';
import { houseMeasures } from './house-measures';

/** Factors: NIST SP 811 (2008), appendix B.8: 1 ft = 0.3048 m, 1 psi = 6.894757 kPa. */
describe('measures of a house', () => {
  it('are feet and psi as they are stored, unless metric is chosen', () => {
    const { show, read, unitOf } = houseMeasures('us');
    expect([show(13.5, 'length'), show(17, 'pressure'), show(null, 'length')]).toEqual(['13.5', '17', '']);
    expect([read('13,5', 'length'), read(' ', 'length'), read('high', 'length')]).toEqual([13.5, null, Number.NaN]);
    expect([unitOf('length'), unitOf('pressure')]).toEqual(['ft', 'psi']);
  });

  it('are metres and kPa by choice', () => {
    const { show, read, unitOf } = houseMeasures('metric');
    expect([show(10, 'length'), show(100, 'pressure')]).toEqual(['3.048', '689.5']);
    expect(read('3', 'length')).toBeCloseTo(3 / 0.3048, 3);
    expect(read('700', 'pressure')).toBeCloseTo(700 / 6.894757, 3);
    expect([unitOf('length'), unitOf('pressure')]).toEqual(['m', 'kPa']);
  });

  it('do not change by being looked at, nor where two of them look alike', () => {
    const { show, read } = houseMeasures('metric');
    for (let tenths = -100; tenths <= 600; tenths += 1) {
      const feet = tenths / 10;
      expect(read(show(feet, 'length'), 'length')).toBe(feet);
      expect(read(show(feet, 'pressure'), 'pressure')).toBe(feet);
    }
    const alike = [21, 21.0001].map((feet) => show(feet, 'length'));
    expect(alike.map((words) => read(words, 'length'))).toEqual([21, 21.0001]);
  });

  it('are shown again as they were typed', () => {
    for (const typed of ['6.4', '3.05', '0.001', '-1.2', '12.345']) {
      const feet = houseMeasures('metric').read(typed, 'length');
      expect(houseMeasures('metric').show(feet, 'length')).toBe(typed);
    }
  });
});
