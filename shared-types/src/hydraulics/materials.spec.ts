import { describe, expect, it } from 'vitest';
import { isPlastic, materials, mayHoldAir, mayHoldAirInWaterLine } from './materials.js';

const both = { airOnPlastic: true, makersAllowAir: true };
const oneOfTwo = [
  { airOnPlastic: true, makersAllowAir: false },
  { airOnPlastic: false, makersAllowAir: true },
  { airOnPlastic: false, makersAllowAir: false },
];

describe('materials', () => {
  it('the first four are plastic', () => {
    expect(materials.filter(isPlastic)).toEqual(['pvc', 'abs', 'cpvc', 'pex']);
  });

  it('takes air in plastic DWV only where the department and every maker allow it', () => {
    // IPC 312.3; CPC 712.1
    expect(materials.filter((material) => mayHoldAir(material, both))).toEqual(materials);
    for (const allowed of oneOfTwo) {
      expect(materials.filter((material) => mayHoldAir(material, allowed))).toEqual(['copper', 'cast-iron', 'steel']);
    }
  });

  it('never takes air in PVC, ABS or CPVC water lines, and in PEX only where all allow it', () => {
    // A pipe maker's technical guide (PVC, ABS, CPVC); 2018 IRC M2101.10 (PEX)
    expect(materials.filter((material) => mayHoldAirInWaterLine(material, both))).toEqual([
      'pex',
      'copper',
      'cast-iron',
      'steel',
    ]);
    for (const allowed of oneOfTwo) {
      expect(materials.filter((material) => mayHoldAirInWaterLine(material, allowed))).toEqual([
        'copper',
        'cast-iron',
        'steel',
      ]);
    }
  });
});
