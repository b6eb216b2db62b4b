import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { DepartmentModel } from '../departments/department.model.js';
import type { LotModel } from '../lots/lot.model.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { addLots, ask, asking, setRuleCard } from '../testing/fixtures/visits.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';

let server: TestApp;
let world: World;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server?.close());

async function at(now: string, wish: Parameters<typeof ask>[2]) {
  server.clock.set(now);
  const [lot] = await addLots(server, world, 1);
  const answer = await ask(world, [(lot as LotModel).id], wish);
  return answer.status === 201 ? answer.body.visits[0].window : answer.body.code;
}
const useZone = (zone: string) =>
  DepartmentModel.update({ zone }, { where: { id: world.organizations.department.id } });
const useAsking = (overrides: Partial<RuleCardContent['asking']>) =>
  setRuleCard(server, world.ruleCard.id, ruleCardContent({ asking: asking(overrides) }));

beforeEach(async () => {
  await useZone('America/Denver');
  await useAsking({});
});

// offsets from the IANA time zone database; on 2027-03-02 all three zones keep standard time
describe('the cut-off, 3 pm by the department’s clock', () => {
  it.each([
    ['America/New_York', '20:00', '12:30'],
    ['America/Denver', '22:00', '14:30'],
    ['America/Los_Angeles', '23:00', '15:30'],
  ])('in %s is at %s Z, to the second', async (zone, cutoff, opens) => {
    await useZone(zone);
    const tomorrow = { date: '2027-03-03', label: 'early' };
    expect(await at(`2027-03-02T${cutoff}:00Z`, tomorrow)).toMatchObject({ startAt: `2027-03-03T${opens}:00.000Z` });
    expect(await at(`2027-03-02T${cutoff}:01Z`, tomorrow)).toBe('cut-off-passed');
    expect(await at(`2027-03-02T${cutoff}:01Z`, { date: '2027-03-04', label: 'early' })).toMatchObject({
      date: '2027-03-04',
    });
  });

  it('moves by an hour of the sun when clocks change', async () => {
    // daylight time begins Sunday 2027-03-14: in Denver 3 pm is 22:00 Z on Thursday the 11th, 21:00 Z on Monday the 15th
    expect(await at('2027-03-11T22:00:00Z', { date: '2027-03-15', label: 'early' })).toMatchObject({
      startAt: '2027-03-15T13:30:00.000Z',
    });
    expect(await at('2027-03-11T22:00:01Z', { date: '2027-03-15', label: 'mid' })).toBe('cut-off-passed');
    expect(await at('2027-03-15T21:00:00Z', { date: '2027-03-16', label: 'early' })).toMatchObject({
      startAt: '2027-03-16T13:30:00.000Z',
    });
    expect(await at('2027-03-15T21:00:01Z', { date: '2027-03-16', label: 'mid' })).toBe('cut-off-passed');
    // and ends Sunday 2027-11-07
    expect(await at('2027-11-04T21:00:00Z', { date: '2027-11-08', label: 'early' })).toMatchObject({
      startAt: '2027-11-08T14:30:00.000Z',
    });
    expect(await at('2027-11-04T21:00:01Z', { date: '2027-11-08', label: 'mid' })).toBe('cut-off-passed');
  });

  it('counts a request of a day off for the next working day', async () => {
    // Friday is no working day here: it counts for Monday the 8th, so Tuesday is the first day open
    expect(await at('2027-03-05T17:00:00Z', { date: '2027-03-08', label: 'early' })).toBe('cut-off-passed');
    expect(await at('2027-03-05T17:00:00Z', { date: '2027-03-09', label: 'early' })).toMatchObject({
      date: '2027-03-09',
    });
  });
});

describe('a window of today', () => {
  it('can be asked for until it starts, where the rule card takes requests for the same day', async () => {
    await useAsking({ workingDaysAhead: 0, cutoff: '17:00' });
    expect(await at('2027-03-03T15:59:59Z', { date: '2027-03-03', label: 'mid' })).toMatchObject({
      startAt: '2027-03-03T16:00:00.000Z',
    });
    expect(await at('2027-03-03T16:00:00Z', { date: '2027-03-03', label: 'mid' })).toBe('window-past');
  });
});

describe('on the days clocks change', () => {
  const night = {
    workingDays: [7],
    windows: [{ label: 'night', start: '01:30', end: '03:30', days: [7], room: 9 }],
    workingDaysAhead: 0,
    cutoff: '23:00',
  };

  it('a window that spans the change is an hour shorter or longer', async () => {
    await useAsking(night);
    const [spring, autumn] = [
      await at('2027-03-13T12:00:00Z', { date: '2027-03-14', label: 'night' }),
      await at('2027-11-06T12:00:00Z', { date: '2027-11-07', label: 'night' }),
    ];
    expect(spring).toMatchObject({ startAt: '2027-03-14T08:30:00.000Z', endAt: '2027-03-14T09:30:00.000Z' });
    expect(autumn).toMatchObject({ startAt: '2027-11-07T07:30:00.000Z', endAt: '2027-11-07T10:30:00.000Z' });
  });

  it('a window that the change swallows is none', async () => {
    await useAsking({ ...night, windows: [{ label: 'gone', start: '02:30', end: '03:15', days: [7], room: 9 }] });
    expect(await at('2027-03-13T12:00:00Z', { date: '2027-03-14', label: 'gone' })).toBe('window-unknown');
    expect(await at('2027-03-20T12:00:00Z', { date: '2027-03-21', label: 'gone' })).toMatchObject({
      startAt: '2027-03-21T08:30:00.000Z',
    });
  });
});
