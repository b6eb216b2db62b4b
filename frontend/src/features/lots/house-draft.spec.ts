import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { houseToSave } from '@holdwater/shared-types/lots/house.rules.js';
import { describe, expect, it } from 'vitest';
import { draftOf, drawnDraft, geometryOf, newPlug } from './house-draft';
import { house } from './testing/lot-fixtures';

describe('a house as typed', () => {
  it('is saved as it was read when nothing is typed', () => {
    for (const units of ['us', 'metric'] as const) {
      expect(houseGeometry.parse(geometryOf(draftOf(house, 'first', units)))).toEqual(house);
    }
  });

  it('is drawn and saved in feet when it is typed in metres', () => {
    const draft = { ...draftOf(house, 'first', 'metric'), ventTerminalFt: '7.62', laundryTrapFt: '3.6576' };
    // 1 ft is exactly 0.3048 m (NIST SP 811)
    expect(geometryOf(draft)).toMatchObject({ ventTerminalFt: 25, laundryTrapFt: 12 });
    expect(drawnDraft(draft).ventTerminalFt).toBe(25);
  });

  it('takes the material of a water line onto the list, and no trap without a laundry', () => {
    const draft = {
      ...draftOf(house, 'first'),
      waterPipes: [{ material: 'copper', nominalIn: '0.5', lengthFt: '12' }],
      laundry: { floor: '', boxOutletFt: '3', branchFt: '1' },
      laundryTrapFt: '2',
    };
    const saved = houseToSave.parse(geometryOf(draft));
    expect(saved).toMatchObject({ waterPipeMaterials: ['copper'], laundry: null, laundryTrapFt: null });
    expect(saved.waterPipes).toEqual([{ material: 'copper', nominalIn: 0.5, lengthFt: 12 }]);
  });

  it('is refused with a plug whose size nobody chose', () => {
    const plugs = [{ ...newPlug, name: 'drain', elevationFt: '-3', ratedPsi: '17' }];
    const refused = houseToSave.safeParse(geometryOf({ ...draftOf(house, 'first'), plugs }));
    expect(refused.error?.issues.map(({ path, message }) => [path.join('.'), message])).toEqual([
      ['plugs.0.nominalIn', 'size-missing'],
    ]);
  });

  it('begins with a first floor at height zero and nothing else known', () => {
    const begun = houseGeometry.parse(geometryOf(draftOf(null, 'first')));
    expect(begun.floors).toEqual([{ name: 'first', elevationFt: 0 }]);
    expect(begun.ventTerminalFt).toBeNull();
  });

  it('takes a comma for the point and an empty field for not known', () => {
    const draft = { ...draftOf(house, 'first'), ventTerminalFt: '24,5', atticCutFt: ' ' };
    const parsed = houseGeometry.parse(geometryOf(draft));
    expect([parsed.ventTerminalFt, parsed.atticCutFt]).toEqual([24.5, null]);
  });

  it('is refused by the contract where a measure is no number, and where it is missing in a row', () => {
    const draft = { ...draftOf(house, 'first'), ventTerminalFt: 'high', floors: [{ name: 'first', elevationFt: '' }] };
    const parsed = houseGeometry.safeParse(geometryOf(draft));
    expect(parsed.error?.issues.map(({ path }) => path.join('.'))).toEqual(
      expect.arrayContaining(['ventTerminalFt', 'floors.0.elevationFt']),
    );
  });

  it('is drawn without what is not a measure yet', () => {
    const draft = { ...draftOf(house, 'first'), ventTerminalFt: '1e9', floors: [{ name: 'first', elevationFt: '-' }] };
    expect(drawnDraft(draft)).toMatchObject({ ventTerminalFt: null, floors: [] });
  });
});
