import { describe, expect, it } from 'vitest';
import { layOutRoad, type RoadStopPlace } from './run-road-layout';

const stop = (atMile: number, hasDetail = false): RoadStopPlace => ({ atMile, hasDetail });

describe('layOutRoad', () => {
  it('draws miles to scale', () => {
    const road = layOutRoad([stop(2), stop(18)], 20, 440);
    expect(road.yOfMile(20) - road.yOfMile(10)).toBeCloseTo(road.yOfMile(10) - road.yOfMile(0), 9);
  });

  it('keeps words at their mile where there is room', () => {
    const road = layOutRoad([stop(5), stop(15)], 20, 440);
    expect(road.stops).toEqual([road.yOfMile(5), road.yOfMile(15)]);
  });

  it('keeps words apart, in order, and on the road, wherever the stops crowd', () => {
    for (const miles of [
      [4.3, 4.4, 4.5, 4.5],
      [0, 0, 0],
      [19.8, 19.9, 20],
    ]) {
      const road = layOutRoad(
        miles.map((mile) => stop(mile, true)),
        20,
        300,
      );
      road.stops.slice(1).forEach((y, index) => expect(y - (road.stops[index] ?? 0)).toBeGreaterThanOrEqual(46 - 1e-9));
      expect(Math.min(...road.stops)).toBeGreaterThanOrEqual(road.top);
      expect(Math.max(...road.stops)).toBeLessThanOrEqual(road.height);
    }
  });

  it('leaves room for the words between two stops', () => {
    const [first = 0, second = 0] = layOutRoad([{ ...stop(4), hasAside: true }, stop(4)], 20, 300).stops;
    expect(second - first).toBeGreaterThanOrEqual(60);
  });
});
