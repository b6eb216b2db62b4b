import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';

/** What waits of one kind on one person or organization. */
export interface WaitingGroup {
  readonly kind: WaitingItem['kind'];
  readonly isOnYou: boolean;
  readonly waitsOn: string;
  readonly items: readonly WaitingItem[];
  readonly count: number;
  /** The first deadline, with its zone. */
  readonly by: { readonly at: string; readonly zone: string } | null;
  readonly isPastTime: boolean;
}

/** A test of next week that is not up waits for nobody yet: told from here to its deadline, as the days of the ribbon tell it. */
const nearMs = 36 * 3_600_000;

/** Kinds counted by what is to be done on a lot; the others count lots or visits. */
const countedWithin: readonly WaitingItem['kind'][] = [
  'correction-to-fix',
  'correction-to-accept',
  'consent-to-answer',
];

/** What waits, in the order the server gave, one group a kind and name. Of what waits on others only tests that are due soon. */
export function waitingGroups(items: readonly WaitingItem[], now: Date): WaitingGroup[] {
  const told = items.filter((item) => item.isOnYou || item.kind !== 'test-not-up' || isNear(item, now));
  const groups = new Map<string, WaitingItem[]>();
  for (const item of told) {
    const key = `${item.isOnYou} ${item.kind} ${item.isOnYou ? '' : item.waitsOn}`;
    groups.set(key, [...(groups.get(key) ?? []), item]);
  }
  return [...groups.values()].flatMap((of) => {
    const [first] = of;
    return first === undefined ? [] : [groupOf(first, of)];
  });
}

/** How many of a kind wait, whoever they wait on. */
export function countOf(groups: readonly WaitingGroup[]): number {
  return groups.reduce((sum, { count }) => sum + count, 0);
}

/** The numbers of a group's lots, each once, the first few and how many more. */
export function lotsOf({ items }: WaitingGroup): { shown: string[]; more: number } {
  const numbers = [...new Set(items.flatMap(({ lotNumber }) => (lotNumber === null ? [] : [lotNumber])))];
  const shown = numbers.length <= 4 ? numbers : numbers.slice(0, 3);
  return { shown, more: numbers.length - shown.length };
}

function groupOf({ kind, isOnYou, waitsOn }: WaitingItem, items: readonly WaitingItem[]): WaitingGroup {
  const timed = items.flatMap(({ by, zone }) => (by === null || zone === null ? [] : [{ at: by, zone }]));
  const count = countedWithin.includes(kind) ? items.reduce((sum, item) => sum + item.count, 0) : items.length;
  return {
    ...{ kind, isOnYou, waitsOn, items, count },
    by: timed.reduce<WaitingGroup['by']>((a, b) => (a === null || Date.parse(b.at) < Date.parse(a.at) ? b : a), null),
    isPastTime: items.some(({ isPastTime }) => isPastTime),
  };
}

function isNear({ by, isPastTime }: WaitingItem, now: Date): boolean {
  return isPastTime || (by !== null && Date.parse(by) - now.getTime() <= nearMs);
}
