import { describe, expect, it } from 'vitest';
import { layOutLane } from './lane-layout';

const scale = { fromHour: 7, pxPerHour: 72, leastPx: 36 };

describe('slips on a lane', () => {
  it('stand at their hour, as long as planned', () => {
    const [slip] = layOutLane([{ id: 'a', fromHour: 9, toHour: 10 }], scale);
    expect(slip).toEqual({ id: 'a', topPx: 144, heightPx: 70, track: 0, tracks: 1 });
  });

  it('share the width where one would cover another, and only there', () => {
    const placed = layOutLane(
      [
        { id: 'a', fromHour: 9, toHour: 9.5 },
        { id: 'b', fromHour: 9, toHour: 9.5 },
        { id: 'c', fromHour: 9.25, toHour: 9.75 },
        { id: 'd', fromHour: 11, toHour: 11.5 },
      ],
      scale,
    );
    expect(placed.map(({ track, tracks }) => [track, tracks])).toEqual([
      [0, 3],
      [1, 3],
      [2, 3],
      [0, 1],
    ]);
  });

  it('keep room for their words however short the visit, and then count as that long', () => {
    const placed = layOutLane(
      [
        { id: 'a', fromHour: 9, toHour: 9.1 },
        { id: 'b', fromHour: 9.25, toHour: 9.5 },
      ],
      scale,
    );
    expect(placed.map(({ heightPx, tracks }) => [heightPx, tracks])).toEqual([
      [36, 2],
      [36, 2],
    ]);
  });
});
