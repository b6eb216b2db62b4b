/** Something that stands on a lane from one hour to another. */
export interface Spanned {
  readonly id: string;
  readonly fromHour: number;
  readonly toHour: number;
}

export interface Placed {
  readonly id: string;
  readonly topPx: number;
  readonly heightPx: number;
  /** Which of `tracks` equal parts of the lane's width it takes, from 0. */
  readonly track: number;
  readonly tracks: number;
}

export interface LaneScale {
  readonly fromHour: number;
  readonly pxPerHour: number;
  /** A slip keeps room for its words however short the visit. */
  readonly leastPx: number;
}

/** Places spans so that none covers another: those that would, share the width. Input in order of time. */
export function layOutLane(spans: readonly Spanned[], { fromHour, pxPerHour, leastPx }: LaneScale): Placed[] {
  const boxes = spans.map(({ id, fromHour: from, toHour }) => ({
    id,
    topPx: Math.round((from - fromHour) * pxPerHour),
    heightPx: Math.max(leastPx, Math.round((toHour - from) * pxPerHour) - 2),
  }));
  const placed: Placed[] = [];
  let group: Omit<Placed, 'tracks'>[] = [];
  const endsOf = (): number => Math.max(...group.map((box) => box.topPx + box.heightPx));
  const close = (): void => {
    const tracks = Math.max(0, ...group.map((box) => box.track)) + 1;
    placed.push(...group.map((box) => ({ ...box, tracks })));
    group = [];
  };
  for (const box of boxes) {
    if (group.length > 0 && box.topPx >= endsOf()) close();
    group.push({ ...box, track: freeTrack(group, box.topPx) });
  }
  if (group.length > 0) close();
  return placed;
}

function freeTrack(group: readonly Omit<Placed, 'tracks'>[], topPx: number): number {
  for (let track = 0; ; track += 1) {
    const isFree = group.every((box) => box.track !== track || box.topPx + box.heightPx <= topPx);
    if (isFree) return track;
  }
}
