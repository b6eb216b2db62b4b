import { describe, expect, it } from 'vitest';
import { energy, force, planMeasureWords, volume, weight } from './plan-measures';

/** Factors of NIST SP 811 (2008), appendix B.8, taken here by hand. */
describe('numbers of a plan', () => {
  it('are told no finer than pipes are known, in either system of units', () => {
    expect(planMeasureWords(volume(56.3, 'us'))).toBe('56 gal');
    // 56.3 × 3.785412 = 213.1
    expect(planMeasureWords(volume(56.3, 'metric'))).toBe('215 L');
    expect(planMeasureWords(weight(468.2, 'us'))).toBe('470 lb');
    // 468.2 × 0.4535924 = 212.4
    expect(planMeasureWords(weight(468.2, 'metric'))).toBe('210 kg');
  });

  it('never make a force or an energy smaller than it is', () => {
    expect(planMeasureWords(force(121, 'us'))).toBe('130 lb');
    // 121 × 4.448222 = 538.2
    expect(planMeasureWords(force(121, 'metric'))).toBe('550 N');
    // check-values.md, section 2: 3 gal of air at 104 psig hold about 14,300 ft·lbf
    expect(planMeasureWords(energy(14_300, 'us'))).toBe('15,000 ft·lb');
    expect(planMeasureWords(energy(14_300, 'metric'))).toBe('20,000 J');
    expect(planMeasureWords(energy(0, 'us'))).toBe('0 ft·lb');
  });
});
