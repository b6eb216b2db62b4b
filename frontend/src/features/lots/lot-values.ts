import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import type { createLot, LotDetail, permitStatuses, updateLot } from '@holdwater/shared-types/lots/lot.contract.js';

export type PermitStatus = (typeof permitStatuses)[number];

/** A lot as typed. */
export interface LotValues extends Record<string, unknown> {
  number: string;
  address: string;
  tractId: string;
  latitude: string;
  longitude: string;
  permit: { number: string; status: PermitStatus; holder: string };
  access: { gateCode: string; contactName: string; contactPhone: string; hazards: string };
  units: readonly string[];
  mayPlumberRequest: boolean;
  coverDate: string;
  plumber: OrganizationBrief | null;
  department: OrganizationBrief | null;
}

export function emptyLot(tractId: string): LotValues {
  return {
    ...{ number: '', address: '', tractId, latitude: '', longitude: '' },
    permit: { number: '', status: 'not-applied', holder: '' },
    access: { gateCode: '', contactName: '', contactPhone: '', hazards: '' },
    ...{ units: [''], mayPlumberRequest: false, coverDate: '', plumber: null, department: null },
  };
}

const text = (value: string | null): string => value ?? '';

export function valuesOf(lot: LotDetail): LotValues {
  const { permit, access } = lot;
  return {
    ...emptyLot(lot.tract?.id ?? ''),
    number: lot.number,
    address: lot.address,
    latitude: lot.latitude === null ? '' : String(lot.latitude),
    longitude: lot.longitude === null ? '' : String(lot.longitude),
    permit: { number: text(permit.number), status: permit.status, holder: text(permit.holder) },
    access: {
      gateCode: text(access?.gateCode ?? null),
      contactName: text(access?.contactName ?? null),
      contactPhone: text(access?.contactPhone ?? null),
      hazards: text(access?.hazards ?? null),
    },
    units: lot.units.map(({ label }) => label),
    mayPlumberRequest: lot.mayPlumberRequest,
    coverDate: text(lot.coverDate),
  };
}

const orNull = (typed: string): string | null => (typed.trim() === '' ? null : typed.trim());
/** NaN for what is no number: the contract then names the fault. */
const numberOrNull = (typed: string): number | null => (typed.trim() === '' ? null : Number(typed));

function fieldsOf(values: LotValues) {
  const { permit, access } = values;
  return {
    number: values.number,
    address: values.address,
    latitude: numberOrNull(values.latitude),
    longitude: numberOrNull(values.longitude),
    permit: { number: orNull(permit.number), status: permit.status, holder: orNull(permit.holder) },
    mayPlumberRequest: values.mayPlumberRequest,
    coverDate: orNull(values.coverDate),
    access: {
      gateCode: orNull(access.gateCode),
      contactName: orNull(access.contactName),
      contactPhone: orNull(access.contactPhone),
      hazards: orNull(access.hazards),
    },
  };
}

/** A new lot. One unit without a name of its own is the house itself. */
export function createBody(values: LotValues, builderId: string): RouteCall<typeof createLot>['body'] {
  const hasUnits = values.units.length > 1 || values.units.some((label) => label.trim() !== '');
  return {
    ...fieldsOf(values),
    builderId,
    tractId: orNull(values.tractId),
    ...(hasUnits ? { units: values.units.map((label) => ({ label })) } : {}),
    plumberId: values.plumber?.id ?? null,
    departmentId: values.department?.id ?? null,
  };
}

/** What is sent of a lot that stands: all of it, or only the permit by those who may set no more. */
export function updateBody(values: LotValues, canEdit: boolean): RouteCall<typeof updateLot>['body'] {
  const fields = fieldsOf(values);
  return canEdit ? fields : { permit: fields.permit };
}
