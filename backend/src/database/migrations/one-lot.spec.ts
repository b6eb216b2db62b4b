import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { HoldModel } from '../../holds/hold.model.js';
import { ReadingModel } from '../../holds/reading.model.js';
import { addClosedVisit, addCorrection, standTest } from '../../testing/fixtures/visits.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';

// That these rules are constraints and not the services' alone is the project's own (quality.md, safety of the data).
describe('what belongs to one lot', () => {
  let server: TestApp;
  let world: World;

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
  });
  afterAll(() => server?.close());

  const constraint = (name: string) => ({ original: { constraint: name } });

  it('keeps a visit to a rule card of its own department', async () => {
    const visit = await addClosedVisit(server, world, world.lots[0], 'fail');
    await expect(visit.update({ ruleCardId: world.otherRuleCard.id })).rejects.toMatchObject(
      constraint('visits_own_rule_card'),
    );
  });

  it('keeps a correction to the lot of its visit, to a unit of it, and to who fixed and accepted it', async () => {
    const visit = await addClosedVisit(server, world, world.lots[1], 'fail', {
      date: '2027-02-25',
      at: '2027-02-25T15:00:00Z',
    });
    const correction = await addCorrection(world, visit, 1);
    const changes = [
      [{ lotId: world.lots[2].id }, 'corrections_own_visit'],
      [{ unitNumber: 9 }, 'corrections_own_unit'],
      [{ state: 'fixed', fixedAt: new Date() }, 'corrections_fixed'],
      [{ acceptedBy: world.people.inspector.id }, 'corrections_accepted'],
    ] as const;
    for (const [change, name] of changes) {
      await expect(correction.update(change), name).rejects.toMatchObject(constraint(name));
      await correction.reload();
    }
  });

  it('takes a level for standing water and a pressure for everything else', async () => {
    const reading = (hold: HoldModel, read: object) =>
      ReadingModel.create({
        id: randomUUID(),
        clientId: randomUUID(),
        holdId: hold.id,
        madeAt: new Date(),
        receivedAt: new Date(),
        byPerson: world.people.plumber.id,
        byRole: 'plumber',
        ...read,
      });
    const dwv = await standTest(server, world, world.lots[3], 'dwv');
    const water = await standTest(server, world, world.lots[3], 'water');
    await expect(reading(dwv, { pressurePsi: 5, gaugeValve: 'open' })).rejects.toThrow(
      'of the kind its test is read by',
    );
    await expect(reading(water, { levelIn: 2 })).rejects.toThrow('of the kind its test is read by');
    await expect(reading(water, { pressurePsi: 120, gaugeValve: 'open' })).resolves.toBeDefined();
  });
});
