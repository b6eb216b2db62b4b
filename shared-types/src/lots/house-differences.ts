import { emptyHouse, houseGeometry, type HouseGeometry } from '../hydraulics/house-geometry.js';

export type HousePart = keyof HouseGeometry;

/** Every part of a house that may be as in its model or another, in the order it is written down. */
export const houseParts = Object.keys(emptyHouse()) as [HousePart, ...HousePart[]];

/** A house as it would be saved now: one saved before a part was known lacks it. */
const whole = (house: HouseGeometry): HouseGeometry => {
  const parsed = houseGeometry.safeParse(house);
  return parsed.success ? parsed.data : { ...emptyHouse(), ...house };
};

/** The parts in which two houses differ; none for one and the same house, whatever the order of its keys. */
export function differingParts(one: HouseGeometry, other: HouseGeometry): HousePart[] {
  const [a, b] = [whole(one), whole(other)];
  return houseParts.filter((part) => JSON.stringify(a[part]) !== JSON.stringify(b[part]));
}

/**
 * A house brought to the next version of its model with its own changes kept: what differs from the version it was taken from stays, all else
 * becomes what the next version has. The answer still has to be checked: changes that fitted the old version may not fit the next.
 */
export function keepOwnChanges(base: HouseGeometry, own: HouseGeometry, next: HouseGeometry): HouseGeometry {
  const kept = differingParts(base, own).map((part) => [part, own[part]]);
  return { ...next, ...(Object.fromEntries(kept) as Partial<HouseGeometry>) };
}
