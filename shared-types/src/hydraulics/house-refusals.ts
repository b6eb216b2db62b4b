import type { z } from 'zod';
import type { Floor, Laundry, Pipe } from './house-fields.js';
import type { IssueCode } from './issue-codes.js';
import { isAbove } from './tolerance.js';

/** Refuses the value at `path`. */
export type Refuse = (path: readonly (string | number)[], code: IssueCode) => void;

/** Turns a refinement's context into `Refuse`. */
export const refuseIn =
  (ctx: z.RefinementCtx): Refuse =>
  (path, code) =>
    ctx.addIssue({ code: 'custom', message: code, path: [...path] });

/** Each floor has a name of its own: the later one is refused. */
export function refuseFloorsNamedTwice(floors: readonly Floor[], refuse: Refuse): void {
  const seen = new Set<string>();
  floors.forEach(({ name }, index) => {
    if (seen.has(name)) refuse(['floors', index, 'name'], 'floor-named-twice');
    seen.add(name);
  });
}

export function refusePipesUpsideDown(pipes: readonly Pipe[], refuse: Refuse): void {
  pipes.forEach(({ bottomFt, topFt }, index) => {
    if (isAbove(bottomFt, topFt)) refuse(['pipes', index, 'bottomFt'], 'bottom-above-top');
  });
}

export function refuseUnknownLaundryFloor(laundry: Laundry, floors: readonly Floor[], refuse: Refuse): void {
  if (!floors.some(({ name }) => name === laundry.floor)) refuse(['laundry', 'floor'], 'floor-unknown');
}

/** `low` may not stand above `high`; where either is absent there is nothing to refuse. */
export function refuseAbove(
  low: number | null,
  high: number | null,
  path: readonly (string | number)[],
  code: IssueCode,
  refuse: Refuse,
): void {
  if (low !== null && high !== null && isAbove(low, high)) refuse(path, code);
}
