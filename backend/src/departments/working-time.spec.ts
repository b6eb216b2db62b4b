import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { publishRuleCard } from '../testing/fixtures/world.places.js';
import { askingFixture, ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { daysOff } from './days-off.js';
import { WorkingTimeQueries } from './working-time.queries.js';

let server: TestApp;
let world: World;
let workingTime: WorkingTimeQueries;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  workingTime = server.get(WorkingTimeQueries);
});
afterAll(() => server.close());

describe('working time of a department', () => {
  it('counts a request for the day up to the cut-off, to the minute, in the department’s zone', async () => {
    const { id } = world.organizations.department;
    // Tuesday 15:00 in Denver is 22:00 UTC
    const inTime = await workingTime.noticeFor(id, new Date('2027-03-02T22:00:00Z'));
    expect(inTime).toMatchObject({
      countsForDate: '2027-03-02',
      firstDate: '2027-03-03',
      zone: 'America/Denver',
      cutoffAt: '2027-03-02T22:00:00.000Z',
    });
    const late = await workingTime.noticeFor(id, new Date('2027-03-02T22:00:00.001Z'));
    expect(late).toMatchObject({ countsForDate: '2027-03-03', firstDate: '2027-03-04' });
    expect(inTime.windows[0]).toEqual({
      date: '2027-03-03',
      label: 'early',
      startAt: '2027-03-03T14:30:00.000Z',
      endAt: '2027-03-03T16:00:00.000Z',
      ruleCardId: world.ruleCard.id,
      room: 3,
    });
  });

  it('leaves out a federal holiday, unless the department drops it, and keeps its own', async () => {
    const { id } = world.organizations.department;
    // Memorial Day 2027 is Monday the 31st of May (5 U.S.C. 6103(a); OPM list of 2027)
    expect(await workingTime.closedOn(id, '2027-05-31')).toEqual({
      date: '2027-05-31',
      isWorkingDay: false,
      closed: [{ from: null, to: null, why: '', holidayCode: 'memorial-day' }],
    });
    expect(
      daysOff({ federal: true, adds: ['2027-12-27'], drops: ['2027-05-31'] }, 2027, 2027).map(({ date }) => date),
    ).not.toContain('2027-05-31');
    expect(daysOff({ federal: false, adds: ['2027-12-27', '2026-12-28'], drops: [] }, 2027, 2027)).toEqual([
      { date: '2027-12-27', code: null },
    ]);
  });

  it('answers for years before the federal list is known', async () => {
    const [day] = await workingTime.daysBetween(world.organizations.department.id, '1970-01-01', '1970-01-01');
    expect(day).toEqual({ date: '1970-01-01', isWorkingDay: false, closed: [] });
    expect(daysOff({ federal: true, adds: ['1970-01-02'], drops: [] }, 1970, 1970)).toEqual([
      { date: '1970-01-02', code: null },
    ]);
  });

  it('takes each day’s windows from the version in force on that day', async () => {
    const { id } = world.organizations.otherDepartment;
    await server.db.query(
      `UPDATE rule_cards SET effective = daterange('2027-01-01', '2027-03-08') WHERE department_id = :id`,
      { replacements: { id } },
    );
    const [window] = askingFixture.windows;
    const asking = { ...askingFixture, windows: [{ ...window!, label: 'dawn', room: 5 }] };
    const next = await publishRuleCard(server, id, ruleCardContent({ asking }), {
      version: 2,
      effectiveFrom: '2027-03-08',
    });
    const windows = await workingTime.windowsBetween(id, '2027-03-04', '2027-03-08');
    expect(windows.map(({ date, label, room }) => [date, label, room])).toEqual([
      ['2027-03-04', 'early', 3],
      ['2027-03-04', 'mid', 3],
      ['2027-03-04', 'noon', 3],
      ['2027-03-04', 'late', 3],
      ['2027-03-08', 'dawn', 5],
    ]);
    expect(windows.at(-1)?.ruleCardId).toBe(next.id);
    const notice = await workingTime.noticeFor(id, new Date('2027-03-04T16:00:00Z'));
    expect(notice.windows.map(({ label }) => label)).toContain('dawn');
  });

  it('says so when no rule card is in force', async () => {
    await expect(
      workingTime.noticeFor(world.organizations.department.id, new Date('2026-06-01T12:00:00Z')),
    ).rejects.toMatchObject({ code: 'no-rule-card' });
  });

  it('looks far enough ahead for a horizon of a year of one day a week', async () => {
    const asking = {
      ...askingFixture,
      workingDays: [1],
      workingDaysAhead: 60,
      horizonWorkingDays: 260,
      windows: [{ ...askingFixture.windows[0]!, days: [] }],
    };
    await server.db.query(
      `UPDATE rule_cards SET effective = daterange('2027-01-01', '2027-04-01') WHERE department_id = :id`,
      {
        replacements: { id: world.organizations.department.id },
      },
    );
    await publishRuleCard(server, world.organizations.department.id, ruleCardContent({ asking }), {
      version: 2,
      effectiveFrom: '2027-04-01',
    });
    const notice = await workingTime.noticeFor(world.organizations.department.id, new Date('2027-04-05T12:00:00Z'));
    // Labor Day 2032 is Monday the 6th of September
    const lastYear = notice.windows.filter(({ date }) => date.startsWith('2032-09')).map(({ date }) => date);
    expect(lastYear).toEqual(['2032-09-13', '2032-09-20', '2032-09-27']);
  });
});
