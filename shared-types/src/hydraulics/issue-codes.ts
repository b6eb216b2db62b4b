/**
 * Every code an input of the computations can be refused with. The page translates them (`issues.<code>`); they are the values of `fields` in
 * the answer to bad input.
 */
export const issueCodes = [
  'required',
  'unknown',
  'must-be-an-object',
  'must-be-a-list',
  'must-be-a-number',
  'must-be-a-whole-number',
  'must-be-text',
  'must-be-yes-or-no',
  'must-be-an-instant',
  'not-one-of-the-choices',
  'must-be-positive',
  'must-not-be-negative',
  'out-of-range',
  'too-many',
  'too-long',
  'at-or-below-absolute-zero',
  'water-temperature-out-of-range',
  'floor-named-twice',
  'floor-unknown',
  'lowest-above-highest',
  'bottom-above-top',
  'level-above-vent-terminal',
  'ends-before-it-starts',
  'overlap-not-below-section',
  'too-many-sections',
  'increment-or-percent',
  'readings-out-of-order',
  'point-on-center',
  'marks-in-one-direction',
] as const;
export type IssueCode = (typeof issueCodes)[number];
