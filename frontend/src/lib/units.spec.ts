import { describe, expect, it } from 'vitest';
import { height, measureWords, pressureRange, readLevel, readPressure, temperature, workedPressure } from './units';

// Rounding by interface.md, section 9. Factors: NIST SP 811 (2008), B.8: 1 psi = 6.894757 kPa, 1 ft = 0.3048 m, 1 in = 2.54 cm.
describe('pressure', () => {
  it('is shown as read to half a mark, worked out to a whole one', () => {
    expect(measureWords(readPressure(57.5, 1))).toBe('57.5 psi');
    expect(measureWords(readPressure(112, 2))).toBe('112 psi');
    expect(measureWords(workedPressure(48.7, 1))).toBe('49 psi');
    expect(measureWords(workedPressure(48.7, 2))).toBe('48 psi');
    expect(measureWords(readPressure(5.3, 0.1))).toBe('5.3 psi');
  });

  it('on a mark prints no places that were not read, between two marks the half', () => {
    expect(measureWords(readPressure(116, 1))).toBe('116 psi');
    expect(measureWords(readPressure(116.5, 1))).toBe('116.5 psi');
    expect(measureWords(readPressure(116.2, 1))).toBe('116 psi');
    expect(measureWords(readPressure(100, 0.1))).toBe('100 psi');
    // Worked out: a whole mark, with the places of the mark.
    expect(measureWords(workedPressure(116.2, 1))).toBe('116 psi');
    expect(measureWords(workedPressure(10, 0.1))).toBe('10.0 psi');
  });

  it('of a range is rounded outward and is one number where both ends meet', () => {
    expect(measureWords(pressureRange(57.2, 58.4, 1))).toBe('57–59 psi');
    expect(measureWords(pressureRange(58, 58, 1))).toBe('58 psi');
    // 0.1 + 0.2 sits on the mark but for floating error.
    expect(measureWords(pressureRange(0.1 + 0.2, 0.3, 0.1))).toBe('0.3 psi');
  });

  it('in kPa is never finer than the gauge', () => {
    // Half of a 1 psi mark is 3.45 kPa: the next of 1, 2, 5, 10 is 5. 57.5 psi = 396.4 kPa.
    expect(measureWords(readPressure(57.5, 1, 'metric'))).toBe('395 kPa');
    // A 1 psi mark is 6.89 kPa: steps of 10. 50 psi = 344.7 kPa.
    expect(measureWords(workedPressure(50, 1, 'metric'))).toBe('340 kPa');
  });
});

describe('heights, levels and temperatures', () => {
  it('are as fine as they are measured', () => {
    expect(measureWords(height(24))).toBe('24.0 ft');
    expect(measureWords(height(24, 'metric'))).toBe('7.3 m');
    expect(measureWords(readLevel(2.25, 0.5))).toBe('2.25 in');
    expect(measureWords(readLevel(2, 0.25))).toBe('2 in');
    expect(measureWords(readLevel(10, 0.125, 'metric'))).toBe('25.4 cm');
    expect(measureWords(temperature(32, 'metric'))).toBe('0 °C');
    expect(measureWords(temperature(61))).toBe('61 °F');
  });
});
