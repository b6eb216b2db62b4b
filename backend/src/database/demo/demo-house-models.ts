import {
  addHouseModelVersion,
  applyHouseModel,
  createHouseModel,
  type HouseModelBrief,
  listHouseModels,
} from '@holdwater/shared-types/lots/house-model.contract.js';
import { setGeometry } from '@holdwater/shared-types/lots/lot.contract.js';
import type { DemoClient } from './demo-client.js';
import { type DemoHouse, demoHouseChanges, demoHouseNames, demoHouses, nextDemoVersions } from './demo-houses.js';
import type { DemoLot } from './demo-lots.js';

interface Houses {
  readonly superintendent: string;
  readonly lots: readonly DemoLot[];
}

/** Gives the lots of a tract their houses from the builder's models, saved when they are first built, as the superintendent does. */
export async function giveHouses(
  client: DemoClient,
  builderId: string,
  { superintendent, lots }: Houses,
  ids: ReadonlyMap<string, string>,
): Promise<void> {
  for (const house of new Set(lots.map((lot) => lot.house))) {
    const model = await savedModel(client, builderId, superintendent, house);
    const units = lots.filter((lot) => lot.house === house).flatMap((lot) => unitsOf(lot, ids.get(lot.number) ?? ''));
    const params = { houseModelId: model.id };
    await client.call(applyHouseModel, superintendent, { params, body: { expectedVersion: model.version, units } });
    const next = nextDemoVersions[house];
    if (next && model.version === 1)
      await client.call(addHouseModelVersion, superintendent, {
        params,
        body: { expectedVersion: 1, geometry: next },
      });
  }
  for (const lot of lots) await changeOnLot(client, superintendent, lot, ids.get(lot.number) ?? '');
}

async function savedModel(
  client: DemoClient,
  builderId: string,
  superintendent: string,
  house: DemoHouse,
): Promise<Pick<HouseModelBrief, 'id' | 'version'>> {
  const name = demoHouseNames[house];
  const { items } = await client.call(listHouseModels, superintendent, { query: { builderId } });
  const body = { builderId, name, geometry: demoHouses[house] };
  return items.find((each) => each.name === name) ?? client.call(createHouseModel, superintendent, { body });
}

function unitsOf(lot: DemoLot, lotId: string) {
  return Array.from({ length: lot.units ?? 1 }, (_, index) => ({ lotId, unitNumber: index + 1 }));
}

async function changeOnLot(client: DemoClient, superintendent: string, lot: DemoLot, lotId: string): Promise<void> {
  const change = demoHouseChanges[lot.address];
  if (change === undefined) return;
  await client.call(setGeometry, superintendent, {
    params: { lotId, unitNumber: 1 },
    body: { geometry: { ...demoHouses[lot.house], ...change } },
  });
}
