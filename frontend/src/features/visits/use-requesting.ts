import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { OfferedWindow } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQueries, useQuery, type UseQueryResult } from '@tanstack/react-query';
import { useState } from 'react';
import { offersQuery, type Offers, type OffersAsked } from './api/offers';
import { requestedLotQuery } from './api/requested-lot';
import { ruleCardOfLotQuery } from './api/rule-card-of-lot';
import { reasonsFor, windowKey, type OfferReason } from './offer-reasons';
import { faultOf, sharedStages, type ChosenLot, type SharedStage } from './requested-lots';
import { unitsToAsk, withUnitToggled, type UnitChoices } from './requested-units';

export interface Offer {
  readonly number: number;
  readonly window: OfferedWindow;
  readonly reasons: readonly OfferReason[];
}

export interface Requesting {
  readonly lots: readonly ChosenLot[];
  readonly stages: readonly SharedStage[];
  readonly stage: SharedStage | null;
  /** What is asked for; null while it cannot be. */
  readonly asked: OffersAsked | null;
  readonly query: UseQueryResult<Offers>;
  readonly offers: readonly Offer[];
  readonly chosen: Offer | null;
  /** Null takes the choice back. */
  readonly choose: (key: string | null) => void;
  /** Takes a unit of a lot of several in or out. */
  readonly toggleUnit: (lot: LotDetail, unitNumber: number) => void;
}

/**
 * What a request of these lots is about: their shared stages, what stands in the way, and the windows on offer. The first offer is chosen
 * until another is; a chosen window that is gone leaves none chosen, so that nobody books another than the one they read.
 */
export function useRequesting(lotIds: readonly string[], stageCode: string | null): Requesting {
  const [choices, setChoices] = useState<UnitChoices>({});
  const details = useQueries({ queries: lotIds.map((lotId) => requestedLotQuery(lotId)) });
  const known = details.flatMap(({ data }) => (data === undefined ? [] : [data]));
  const stages = sharedStages(known);
  const wanted = stageCode ?? known[0]?.currentStage ?? null;
  const stage = stages.find(({ code }) => code === wanted) ?? stages[0] ?? null;
  const lots = lotIds.map((id, index): ChosenLot => {
    const { data, error } = details[index] ?? {};
    const units = data === undefined || stage === null ? [] : unitsToAsk(data, stage.code, choices);
    const fault = faultOf(data, known[0], stage?.code ?? null, units);
    return { id, lot: data ?? null, error: error ?? null, fault, units };
  });
  const canAsk = stage !== null && lots.length > 0 && lots.every(({ lot, fault }) => lot !== null && fault === null);
  const asked = canAsk ? { lots: lots.map(lotAsked), stageCode: stage.code } : null;
  const query = useQuery({
    ...offersQuery(asked ?? { lots: [], stageCode: '' }),
    enabled: asked !== null,
  });
  const offers = useOffers(asked === null ? undefined : query.data, known, stage);
  const about = JSON.stringify(asked);
  const [choice, setChoice] = useChoice(about, offers);
  return {
    lots,
    stages,
    stage,
    asked,
    query,
    offers,
    chosen: offers.find(({ window }) => windowKey(window) === choice) ?? null,
    choose: setChoice,
    toggleUnit: (lot, unitNumber) => {
      if (stage !== null) setChoices((before) => withUnitToggled(before, lot, stage.code, unitNumber));
    },
  };
}

/** A lot of one unit is asked for as a whole: the server knows its unit. */
function lotAsked({ id, units }: ChosenLot): OffersAsked['lots'][number] {
  const unitNumbers = units.filter(({ isChosen }) => isChosen).map(({ number }) => number);
  return units.length === 0 ? { lotId: id } : { lotId: id, unitNumbers };
}

/** The key chosen for what is asked now. The first offer known is taken once and then kept, whatever is read later. */
function useChoice(about: string, offers: readonly Offer[]): [string | null, (key: string | null) => void] {
  const [kept, setKept] = useState<{ about: string; key: string | null } | null>(null);
  const first = offers[0];
  if (kept?.about !== about && first !== undefined) setKept({ about, key: windowKey(first.window) });
  return [kept?.about === about ? kept.key : null, (key) => setKept({ about, key })];
}

function useOffers(data: Offers | undefined, lots: readonly LotDetail[], stage: SharedStage | null): readonly Offer[] {
  const ruleCardId = lots[0]?.ruleCard?.id;
  const ruleCard = useQuery({ ...ruleCardOfLotQuery(ruleCardId ?? ''), enabled: ruleCardId !== undefined });
  if (data === undefined) return [];
  const isTested = (stage?.systems.length ?? 0) > 0;
  const upBy = isTested ? (ruleCard.data?.content.readiness.upBy ?? null) : null;
  const context = { lots: lots.length, firstDate: data.firstDate, zone: data.zone, booking: data.booking, upBy };
  return data.windows
    .filter(({ isTakeable }) => isTakeable)
    .map((window, index) => ({ number: index + 1, window, reasons: reasonsFor(window, context) }));
}
