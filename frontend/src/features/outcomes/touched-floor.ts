import { drawHouse, type CutawayHouse } from '../../drawings/cutaway-house';
import { cutawayScale } from '../../drawings/cutaway-scale';
import type { TouchPlace } from '../../drawings/touch-surface';

/** Fractions of the frame are the same at every size; any will do. */
const anyWidthPx = 600;
const anyHeightPx = 600;

/** The floor a touched place lies on: the highest one whose boards are not above it. Null below the lowest. */
export function touchedFloor(house: CutawayHouse, place: TouchPlace): string | null {
  const drawn = drawHouse(house);
  const { frame, y } = cutawayScale(drawn, anyWidthPx, anyHeightPx, false);
  const touchedY = frame.top + place.y * frame.height;
  const under = drawn.floors.filter(({ heightFt }) => y(heightFt) >= touchedY);
  return under.at(-1)?.name ?? null;
}
