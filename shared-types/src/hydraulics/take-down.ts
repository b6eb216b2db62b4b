import type { DwvMethod, Medium } from '../holds/hold.states.js';
import { buriedByMethod, type TakeDownItem } from '../clearances/take-down.js';
import { when } from './findings.js';

/** What a DWV test leaves to be put back, the buried things first. */
export function dwvTakeDown(method: DwvMethod, cappedVents: number, plugCount: number): TakeDownItem[] {
  return [
    ...(buriedByMethod[method] ?? []),
    ...when<TakeDownItem>(method === 'air', () => 'release-air'),
    ...when<TakeDownItem>(cappedVents > 0, () => 'uncap-vents'),
    ...when<TakeDownItem>(plugCount > 0, () => 'remove-test-plugs'),
    'remove-caps',
    'clear-traps',
  ];
}

/** What a water test leaves to be put back. */
export const waterTakeDown = (medium: Medium): TakeDownItem[] => [
  'remove-gauge-and-hose',
  'open-isolated',
  'flush',
  ...when<TakeDownItem>(medium !== 'water', () => 'release-air'),
];
