/** What a stop of the road needs to be placed. */
export interface RoadStopPlace {
  atMile: number;
  hasDetail: boolean;
  /** Words stand between it and the next stop. */
  hasAside?: boolean;
}

export interface RoadLayout {
  height: number;
  pxPerMile: number;
  /** Top of the road, px. */
  top: number;
  yOfMile: (mile: number) => number;
  /** Where each stop's words stand: as near to its mile as the others let it. */
  stops: number[];
}

const top = 12;
const foot = 26;
const rowPx = 38;
const detailRowPx = 46;
const asidePx = 22;

/**
 * The road is drawn to scale; its stops hang on it by leaders. Words never overlap: they are pushed down from the stop before,
 * then up from the end of the road.
 */
export function layOutRoad(stops: readonly RoadStopPlace[], miles: number, minHeight: number): RoadLayout {
  const rows: number[] = stops.map((stop) => (stop.hasDetail ? detailRowPx : rowPx));
  const asides: number[] = stops.map((stop) => (stop.hasAside ? asidePx : 0));
  const needed = [...rows, ...asides].reduce((sum, px) => sum + px, 30);
  const roadPx = Math.max(needed, minHeight - top - foot, miles * 12);
  const pxPerMile = roadPx / Math.max(miles, 0.1);
  const yOfMile = (mile: number): number => top + mile * pxPerMile;
  /** Room between the words of a stop and of the next. */
  const between = (index: number): number =>
    ((rows[index] ?? rowPx) + (rows[index + 1] ?? rowPx)) / 2 + (asides[index] ?? 0);
  const places = stops.map((stop) => yOfMile(stop.atMile));
  places.forEach((place, index) => {
    const before = index === 0 ? top - rowPx / 2 : (places[index - 1] ?? 0);
    const apart = index === 0 ? (rows[0] ?? rowPx) : between(index - 1);
    places[index] = Math.max(place, before + apart);
  });
  for (let index = places.length - 1; index >= 0; index -= 1) {
    const next = index === places.length - 1 ? top + roadPx + 8 : (places[index + 1] ?? 0);
    const apart = index === places.length - 1 ? rowPx : between(index);
    places[index] = Math.min(places[index] ?? 0, next - apart);
  }
  return { height: top + roadPx + foot, pxPerMile, top, yOfMile, stops: places };
}
