import type { Method } from '../holds/hold.states.js';

export const takeDownGroups = ['before-cover', 'before-fixtures', 'before-use'] as const;
export type TakeDownGroup = (typeof takeDownGroups)[number];

/** Every take-down item and the group it belongs to, as pinned. */
export const takeDownItems = {
  'rejoin-vent-cut': 'before-cover',
  'remove-laundry-riser': 'before-cover',
  'close-branch': 'before-cover',
  'close-box-knockout': 'before-cover',
  'cap-test-tees': 'before-cover',
  'cut-standpipe-and-cap': 'before-cover',
  'remove-caps': 'before-fixtures',
  'remove-gauge-and-hose': 'before-fixtures',
  'uncap-vents': 'before-fixtures',
  'remove-test-plugs': 'before-use',
  'clear-traps': 'before-use',
  'open-isolated': 'before-use',
  flush: 'before-use',
  'release-air': 'before-use',
} as const satisfies Record<string, TakeDownGroup>;
export type TakeDownItem = keyof typeof takeDownItems;

/** What a method leaves behind that would be buried. */
export const buriedByMethod: Readonly<Partial<Record<Method, readonly TakeDownItem[]>>> = {
  'attic-cut': ['rejoin-vent-cut'],
  'laundry-riser': ['remove-laundry-riser', 'close-branch'],
  'laundry-box': ['close-box-knockout'],
  standpipe: ['cut-standpipe-and-cap'],
  sectional: ['cap-test-tees'],
};
