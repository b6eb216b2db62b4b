import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { PastPartyModel } from './past-party.model.js';

/** When a reading was struck; the page's own shape says only that it was. */
export type StruckAt = ReadonlyMap<string, Date>;

/** Whether a test is among what a party that was replaced may still read: a plumber's own; a builder's, all of its lot until then. */
export function isOwnEvidence(
  past: Pick<PastPartyModel, 'kind' | 'organizationId' | 'until'>,
  hold: { readonly plumberId: string; readonly receivedAt: Date },
): boolean {
  if (hold.receivedAt > past.until) return false;
  return past.kind === 'builder' || hold.plumberId === past.organizationId;
}

/** A test as it stood at a moment: without what came in, was struck or ended after it. */
export function asOf(hold: Hold, until: Date, struckAt: StruckAt): Hold {
  const isEnded = hold.endedAt !== null && Date.parse(hold.endedAt) <= until.getTime();
  const readings = hold.readings
    .filter(({ receivedAt }) => Date.parse(receivedAt) <= until.getTime())
    .map((reading) => {
      const at = struckAt.get(reading.id);
      return at !== undefined && at > until ? { ...reading, isStruck: false, struckWhy: null } : reading;
    });
  return isEnded ? { ...hold, readings } : { ...hold, state: 'standing', endedAt: null, endReason: null, readings };
}
