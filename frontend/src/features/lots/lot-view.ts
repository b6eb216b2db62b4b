import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { LotDetail, LotStage } from '@holdwater/shared-types/lots/lot.contract.js';
import { openVisitStates } from '@holdwater/shared-types/visits/visit.states.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';

/** Which part of a lot is looked at: a stage, one unit of it, one system. */
export interface LotView {
  readonly stage: LotStage | null;
  readonly unitNumber: number;
  readonly system: System;
  readonly show: (set: { stage?: string; unit?: string; system?: System }) => void;
}

/** States in which somebody has to do with a stage now. */
const statesInPlay: readonly LotStage['state'][] = ['corrections-open', 'awaiting-visit', 'under-test'];

/** What is looked at lives in the address. Without one: the stage in play, else the one the lot is at; its first unit, its first system. */
export function useLotView(lot: LotDetail): LotView {
  const [search, setSearch] = useSearchParams();
  return useMemo(() => {
    const asked = lot.stages.find(({ code }) => code === search.get('stage'));
    const current = lot.stages.find(({ code }) => code === lot.currentStage) ?? lot.stages[lot.stages.length - 1];
    const inPlay = lot.stages.find(({ state }) => statesInPlay.includes(state));
    const stage = asked ?? inPlay ?? current ?? null;
    const systems: readonly System[] = stage?.systems.length ? stage.systems : ['dwv', 'water'];
    const unit = lot.units.find(({ number }) => String(number) === search.get('unit')) ?? lot.units[0];
    return {
      stage,
      unitNumber: unit?.number ?? 1,
      system: systems.find((one) => one === search.get('system')) ?? systems[0] ?? 'dwv',
      show: (set) =>
        setSearch(
          (before) => {
            const after = new URLSearchParams(before);
            for (const [name, value] of Object.entries(set)) if (value !== undefined) after.set(name, value);
            return after;
          },
          { replace: true },
        ),
    };
  }, [lot, search, setSearch]);
}

/** The plumbing state of the unit looked at. */
export function unitState(stage: LotStage, unitNumber: number): LotStage['state'] {
  return stage.units.find((unit) => unit.unitNumber === unitNumber)?.state ?? stage.state;
}

/** The tests of one unit, stage and system, the newest first. */
export function testsOf(holds: readonly Hold[], view: Pick<LotView, 'stage' | 'unitNumber' | 'system'>): Hold[] {
  return holds
    .filter(
      (hold) =>
        hold.stageCode === view.stage?.code && hold.unitNumber === view.unitNumber && hold.system === view.system,
    )
    .sort((a, b) => b.ordinal - a.ordinal);
}

/** The visit that takes or will take place at a stage; null for none. */
export function findOpenVisit(visits: readonly VisitSummary[], stageCode: string | undefined): VisitSummary | null {
  const open: readonly VisitSummary['state'][] = openVisitStates;
  return visits.find((visit) => visit.stageCode === stageCode && open.includes(visit.state)) ?? null;
}

/** The last visit of a stage that was closed with an outcome; null for none. */
export function findLastClosed(visits: readonly VisitSummary[], stageCode: string | undefined): VisitSummary | null {
  const closed = visits.filter((visit) => visit.stageCode === stageCode && visit.state === 'closed');
  return closed.sort((a, b) => b.window.startAt.localeCompare(a.window.startAt))[0] ?? null;
}

/** The lot's zone; the reader's own while no department tells one. */
export function zoneOf(lot: Pick<LotDetail, 'zone'>): string {
  return lot.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
}
