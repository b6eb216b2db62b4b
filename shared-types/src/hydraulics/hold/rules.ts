import type { Medium } from '../../holds/hold.states.js';
import { airGaugePsiAt } from '../air.js';

/** What a sealed system's reading at one temperature would be at another, °F. */
export type Rule = (value: number, fromF: number, toF: number) => number;

const keeps: Rule = (value) => value;

/**
 * Rules of a medium: water keeps its reading, air follows temperature, water topped with air lies between the two because the trapped share is
 * unknown, so both are carried. No medium is a water level.
 */
export function rulesOf(medium: Medium | null, patmPsi: number): readonly [Rule, ...Rule[]] {
  const follows: Rule = (value, fromF, toF) => airGaugePsiAt(value, fromF, toF, patmPsi);
  switch (medium) {
    case 'air':
      return [follows];
    case 'water-topped-with-air':
      return [keeps, follows];
    default:
      return [keeps];
  }
}

/** As the rule says where both temperatures are known; the value as read where one is missing. */
export const carry = (rule: Rule, value: number, fromF: number | null, toF: number | null): number =>
  fromF === null || toF === null ? value : rule(value, fromF, toF);
