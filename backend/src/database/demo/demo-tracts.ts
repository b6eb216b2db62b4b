import { answerConsents, createLot } from '@holdwater/shared-types/lots/lot.contract.js';
import { createTract, type PlatDrawing } from '@holdwater/shared-types/lots/tract.contract.js';
import type { DemoClient } from './demo-client.js';
import type { DemoFoundation } from './demo-foundation.js';
import { giveHouses } from './demo-house-models.js';
import type { DemoLot } from './demo-lots.js';
import { demoOrganizations, demoPeople, type DemoOrganizationKey } from './demo-people.js';

/** Lots of one builder under one department, in a tract or along a street. */
export interface DemoTract {
  name: string | null;
  plat: PlatDrawing | null;
  builder: DemoOrganizationKey;
  superintendent: string;
  department: DemoOrganizationKey;
  desk: string;
  center: { latitude: number; longitude: number };
  permitPrefix: string;
  lots: readonly DemoLot[];
}

/** Adds the lots as the superintendent does and has the others join; answers the id of each lot by its number. */
export async function makeTract(
  client: DemoClient,
  foundation: DemoFoundation,
  tract: DemoTract,
): Promise<Map<string, string>> {
  const builderId = foundation.organizationId(tract.builder);
  const made = tract.name
    ? await client.call(createTract, tract.superintendent, { body: { builderId, name: tract.name, plat: tract.plat } })
    : null;
  const ids = new Map<string, string>();
  for (const [index, lot] of tract.lots.entries()) {
    ids.set(lot.number, await makeLot(client, foundation, tract, lot, index, builderId, made?.id ?? null));
  }
  await giveHouses(client, builderId, tract, ids);
  await joinAll(client, foundation, tract, ids);
  return ids;
}

async function makeLot(
  client: DemoClient,
  foundation: DemoFoundation,
  tract: DemoTract,
  lot: DemoLot,
  index: number,
  builderId: string,
  tractId: string | null,
): Promise<string> {
  const units = Array.from({ length: lot.units ?? 1 }, (_, i) => ({
    label: (lot.units ?? 1) > 1 ? `Unit ${i + 1}` : 'House',
  }));
  const added = await client.call(createLot, tract.superintendent, {
    body: {
      builderId,
      tractId,
      number: lot.number,
      address: lot.address,
      latitude: tract.center.latitude + Math.floor(index / 7) * 0.0009,
      longitude: tract.center.longitude + (index % 7) * 0.0007,
      permit: {
        number: `${tract.permitPrefix}${String(100 + index).padStart(5, '0')}-P`,
        status: lot.permit,
        holder: nameOf(plumberOrganization(lot.plumber)),
      },
      mayPlumberRequest: index % 3 === 0,
      units,
      access: {
        gateCode: lot.gateCode ?? null,
        contactName: 'Site trailer',
        contactPhone: '555-0145',
        hazards: lot.hazards ?? null,
      },
      plumberId: foundation.organizationId(plumberOrganization(lot.plumber)),
      departmentId: foundation.organizationId(tract.department),
    },
  });
  return added.id;
}

async function joinAll(
  client: DemoClient,
  foundation: DemoFoundation,
  tract: DemoTract,
  ids: Map<string, string>,
): Promise<void> {
  const join = (person: string, organization: DemoOrganizationKey, lotIds: string[]) =>
    lotIds.length === 0
      ? Promise.resolve(null)
      : client.call(answerConsents, person, {
          body: { organizationId: foundation.organizationId(organization), lotIds, isJoining: true },
        });
  const lotIdsOf = (plumber: string) =>
    tract.lots.filter((lot) => lot.plumber === plumber).map((lot) => ids.get(lot.number) ?? '');
  for (const plumber of new Set(tract.lots.map((lot) => lot.plumber))) {
    await join(plumber, plumberOrganization(plumber), lotIdsOf(plumber));
  }
  if (tract.desk !== '') await join(tract.desk, tract.department, [...ids.values()]);
}

function plumberOrganization(personKey: string): DemoOrganizationKey {
  const person = demoPeople.find((each) => each.key === personKey);
  const membership = person?.memberships[0];
  if (!membership) throw new Error(`the demo knows no plumber ${personKey}`);
  return membership.organization;
}

function nameOf(key: DemoOrganizationKey): string {
  return demoOrganizations.find((each) => each.key === key)?.name ?? key;
}
