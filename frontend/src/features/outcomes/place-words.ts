import type { Correction, NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { TFunction } from 'i18next';

type Placed = Pick<Correction | NewCorrection, 'place' | 'floor' | 'room'>;

const knownFloors: readonly string[] = ['basement', 'first', 'second', 'third', 'fourth'];

/** "Second floor", or the floor by its own name. `t` knows the namespace `marks`. */
export function floorWords(t: TFunction<['outcomes', 'marks']>, name: string): string {
  const code = name.toLowerCase();
  return knownFloors.includes(code) ? t(`marks.cutaway.floor.${code}`) : t('marks.cutaway.floorNamed', { name });
}

/** "Bath wall, second floor", "the whole system"; empty where only a point on the drawing says where. */
export function placeWords(t: TFunction<['outcomes', 'marks']>, { place, floor, room }: Placed): string {
  const named = [room, floor == null || floor === '' ? null : floorWords(t, floor)].filter(Boolean);
  if (named.length > 0) return named.join(', ');
  return place === 'whole-system' ? t('correction.wholeSystem') : '';
}
