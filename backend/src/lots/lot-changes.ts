import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { updateLot } from '@holdwater/shared-types/lots/lot.contract.js';
import type { LotRecord } from './lot-record.js';

export type LotUpdate = RouteInput<typeof updateLot>['body'];
export type LotFields = Partial<Omit<LotRecord, 'id' | 'builderId' | 'plumberId' | 'departmentId' | 'tractId'>>;

/** The columns an update sets; empty words mean nothing is known. */
export function fieldsGiven({ permit, access, ...fields }: LotUpdate): LotFields {
  return withoutUndefined({
    ...fields,
    ...(permit && {
      permitNumber: permit.number || null,
      permitStatus: permit.status,
      permitHolder: permit.holder || null,
    }),
    ...(access && {
      gateCode: access.gateCode || null,
      contactName: access.contactName || null,
      contactPhone: access.contactPhone,
      hazards: access.hazards || null,
    }),
  });
}

/** Only what differs from what stands: a save without a change changes nothing and is not recorded. */
export function fieldsChanged(lot: LotRecord, given: LotFields): LotFields {
  return Object.fromEntries(Object.entries(given).filter(([key, value]) => lot[key as keyof LotFields] !== value));
}

function withoutUndefined<T extends object>(fields: T): T {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined)) as T;
}
