import { clearStates, type ClearState } from '@holdwater/shared-types/clearances/clearance.rules.js';
import type { LotSummary } from '@holdwater/shared-types/lots/lot.contract.js';
import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';

/** A lot as the table and the plat show it for one stage. */
export interface LotRow {
  readonly lot: LotSummary;
  readonly state: ClearState;
  /** The most pressing thing that waits on somebody; the server sends them in that order. */
  readonly waiting: WaitingItem | null;
}

/** `open`: all but those that are clear or that nobody has begun. `on:<name>`: waits on them. Else a plumbing state. */
export type LotFilter = 'open' | 'all' | 'you' | `on:${string}` | ClearState;

export interface FilterCount {
  readonly filter: LotFilter;
  readonly count: number;
}

/** The states listed by themselves, in the order they press. */
const listedStates = [
  'corrections-open',
  'put-back-due',
  'awaiting-visit',
  'under-test',
  'not-tested',
  'clear',
] as const;

/** The stages any of these lots has, in their departments' order. Two departments may name one code differently: the first is shown. */
export function stagesOf(lots: readonly LotSummary[]): LotSummary['stages'] {
  const seen = new Map<string, LotSummary['stages'][number]>();
  for (const stage of lots.flatMap(({ stages }) => stages)) if (!seen.has(stage.code)) seen.set(stage.code, stage);
  return [...seen.values()].sort((a, b) => a.order - b.order);
}

/** The stage most of these lots are at. */
export function usualStage(lots: readonly LotSummary[]): string | null {
  const counts = new Map<string, number>();
  for (const { currentStage } of lots) {
    if (currentStage !== null) counts.set(currentStage, (counts.get(currentStage) ?? 0) + 1);
  }
  const ranked = [...counts].sort((a, b) => b[1] - a[1]);
  return ranked[0]?.[0] ?? stagesOf(lots)[0]?.code ?? null;
}

/** A row per lot, those that wait on the reader first, then on others, then by what presses, then by number. */
export function lotRows(lots: readonly LotSummary[], stage: string | null, waiting: readonly WaitingItem[]): LotRow[] {
  const byLot = new Map<string, WaitingItem>();
  for (const item of waiting) if (item.lotId !== null && !byLot.has(item.lotId)) byLot.set(item.lotId, item);
  const rows = lots.map((lot) => ({ lot, state: stateOf(lot, stage), waiting: byLot.get(lot.id) ?? null }));
  return rows.sort((a, b) => rank(a) - rank(b) || listed(a) - listed(b) || byNumber(a, b));
}

/** Without a department a lot has no stages and nothing was tested. */
function stateOf(lot: LotSummary, stage: string | null): ClearState {
  return lot.stages.find(({ code }) => code === stage)?.state ?? 'not-tested';
}

function rank({ waiting }: LotRow): number {
  if (waiting === null) return 2;
  return waiting.isOnYou ? 0 : 1;
}

const listed = ({ state }: LotRow): number => listedStates.indexOf(state);

function byNumber(a: LotRow, b: LotRow): number {
  return a.lot.number.localeCompare(b.lot.number, 'en', { numeric: true });
}

/** Lots in the order they lie along a street, for a tract without a plat. */
export function inOrder(rows: readonly LotRow[]): LotRow[] {
  return [...rows].sort(byNumber);
}

function isShown({ state, waiting, lot }: LotRow, filter: LotFilter): boolean {
  if (filter === 'all') return true;
  if (filter === 'open')
    return waiting !== null || lot.nextVisit !== null || (state !== 'clear' && state !== 'not-tested');
  if (filter === 'you') return waiting?.isOnYou === true;
  if (filter.startsWith('on:')) return waiting !== null && !waiting.isOnYou && `on:${waiting.waitsOn}` === filter;
  return state === filter;
}

export function filtered(rows: readonly LotRow[], filter: LotFilter): LotRow[] {
  return rows.filter((row) => isShown(row, filter));
}

/** The filters that would show something, with how much: you first, then others by name, then states. */
export function filterCounts(rows: readonly LotRow[]): FilterCount[] {
  const names = [...new Set(rows.flatMap(({ waiting }) => (waiting && !waiting.isOnYou ? [waiting.waitsOn] : [])))];
  const filters: LotFilter[] = ['you', ...names.map((name): LotFilter => `on:${name}`), ...listedStates];
  return filters.map((filter) => ({ filter, count: filtered(rows, filter).length })).filter(({ count }) => count > 0);
}

/** Narrows what stands in the address. */
export function asFilter(text: string | null): LotFilter {
  if (text === 'all' || text === 'you') return text;
  if (text?.startsWith('on:')) return text as `on:${string}`;
  return clearStates.find((state) => state === text) ?? 'open';
}

/** Counts by state, for the legend of the plat. */
export function stateCounts(rows: readonly LotRow[]): Array<{ state: ClearState; count: number }> {
  return [...clearStates]
    .reverse()
    .map((state) => ({ state, count: rows.filter((row) => row.state === state).length }));
}
