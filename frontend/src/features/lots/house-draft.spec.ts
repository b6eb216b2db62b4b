import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { describe, expect, it } from 'vitest';
import { draftOf, drawnDraft, geometryOf } from './house-draft';
import { house } from './testing/lot-fixtures';

describe('a house as typed', () => {
  it('is saved as it was read when nothing is typed', () => {
    expect(houseGeometry.parse(geometryOf(draftOf(house, 'first')))).toEqual(house);
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
