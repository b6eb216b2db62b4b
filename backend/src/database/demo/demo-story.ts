import { randomUUID } from 'node:crypto';
import { startHold } from '@holdwater/shared-types/holds/hold.contract.js';
import { writeComment } from '@holdwater/shared-types/threads/thread.contract.js';
import { observedFederalHolidays } from '../../scheduling/working-time/federal-holidays.js';
import type { DemoClient } from './demo-client.js';
import { DemoDays } from './demo-days.js';
import type { DemoFoundation } from './demo-foundation.js';
import { tellHandover } from './demo-handovers.js';
import { kettleRiseLots } from './demo-kettle-rise.js';
import { ashquillLots, corrowLots, millpondLots, sorrelBenchLots, type DemoLot } from './demo-lots.js';
import { demoPeople } from './demo-people.js';
import { kettleRise, millpond, sorrelBench } from './demo-plats.js';
import { demoDepartments } from './demo-rule-cards.js';
import { findDemoPlan } from './demo-plans.js';
import type { DemoStage } from './demo-stage.js';
import { makeTract, type DemoTract } from './demo-tracts.js';
import { DemoVisitStory } from './demo-visit-story.js';

const tracts: readonly DemoTract[] = [
  {
    name: 'Sorrel Bench, phase 2',
    plat: sorrelBench(),
    builder: 'odderly',
    superintendent: 'della',
    department: 'tallowmere',
    desk: 'wes',
    center: { latitude: 39.112, longitude: -104.861 },
    permitPrefix: '26-0',
    lots: sorrelBenchLots,
  },
  {
    name: 'Kettle Rise',
    plat: kettleRise(),
    builder: 'penmarrow',
    superintendent: 'hal',
    department: 'tallowmere',
    desk: 'wes',
    center: { latitude: 39.131, longitude: -104.838 },
    permitPrefix: '26-4',
    lots: kettleRiseLots,
  },
  {
    name: 'Millpond, phase 1',
    plat: millpond(),
    builder: 'penmarrow',
    superintendent: 'hal',
    department: 'vennick',
    desk: 'perrin',
    center: { latitude: 39.204, longitude: -104.902 },
    permitPrefix: '26-1',
    lots: millpondLots,
  },
  {
    name: null,
    plat: null,
    builder: 'odderly',
    superintendent: 'della',
    department: 'ashquill',
    desk: 'yara',
    center: { latitude: 44.051, longitude: -121.303 },
    permitPrefix: '26-2',
    lots: ashquillLots,
  },
  {
    name: null,
    plat: null,
    builder: 'odderly',
    superintendent: 'della',
    department: 'corrow',
    desk: '',
    center: { latitude: 39.31, longitude: -104.77 },
    permitPrefix: '26-3',
    lots: corrowLots,
  },
];

/** How many working days before a window it must be asked for, by department. */
const daysAhead: Record<string, number> = { tallowmere: 1, vennick: 2, ashquill: 1, corrow: 1 };

/** Puts every lot's story on the stage. */
export async function tellStory(
  client: DemoClient,
  stage: DemoStage,
  foundation: DemoFoundation,
  present: Date,
): Promise<void> {
  for (const tract of tracts) {
    const ids = await makeTract(client, foundation, tract);
    const department = demoDepartments.find((each) => each.key === tract.department);
    const workingDays = foundation.ruleCards.get(tract.department)?.workingDays ?? [1, 2, 3, 4, 5];
    const days = new DemoDays(present, department?.zone ?? 'America/Denver', workingDays, holidaysAround(present));
    for (const [index, lot] of tract.lots.entries()) {
      tellLot({ client, stage, foundation, tract, days, lot, lotId: ids.get(lot.number) ?? '', spread: index % 25 });
    }
    tellHandover(client, stage, foundation, days, tract.department, ids);
    if (tract.name?.startsWith('Sorrel Bench')) tellThread(client, stage, days, ids.get('17') ?? '');
  }
}

interface LotTelling {
  client: DemoClient;
  stage: DemoStage;
  foundation: DemoFoundation;
  tract: DemoTract;
  days: DemoDays;
  lot: DemoLot;
  lotId: string;
  spread: number;
}

function tellLot(telling: LotTelling): void {
  const { client, stage, foundation, tract, days, lot, lotId, spread } = telling;
  const inspectors = Object.fromEntries(demoPeople.map((each) => [each.name, each.key]));
  const people = { superintendent: tract.superintendent, plumber: lot.plumber, desk: tract.desk, inspectors };
  const state = { lotId, units: Array.from({ length: lot.units ?? 1 }, (_, i) => i + 1), openCorrections: [] };
  for (const plan of lot.visits) {
    new DemoVisitStory(client, stage, days, people, state, plan, daysAhead[tract.department] ?? 1, spread, (key) =>
      foundation.personId(key),
    ).tell();
  }
  if (lot.standing) tellStanding(telling, lot.standing);
}

function tellStanding(
  { client, stage, days, lot, lotId, spread }: LotTelling,
  standing: NonNullable<DemoLot['standing']>,
): void {
  const at = new Date(days.instant(days.workingDate(standing.day), '16:10').getTime() + spread * 60_000);
  stage.at(at, async () => {
    const write = () => ({ clientId: randomUUID(), madeAt: stage.now().toISOString() });
    const { system, method } = standing;
    const part = { lotId, unitNumber: 1, stageCode: 'rough-in', system, method, medium: 'water' } as const;
    const plan = await findDemoPlan(client, lot.plumber, part, stage.now());
    await client.call(startHold, lot.plumber, {
      params: { lotId },
      body: {
        ...write(),
        unitNumber: 1,
        stageCode: 'rough-in',
        system,
        method,
        medium: 'water',
        planId: plan?.id ?? null,
        tape: { incrementIn: 0.25 },
        ...(plan === null && { fillLevelFt: 21 }),
        firstReading: { ...write(), levelIn: 0, temperatureF: 60 },
      },
    });
  });
}

function tellThread(client: DemoClient, stage: DemoStage, days: DemoDays, lotId: string): void {
  const say = (offset: number, time: string, person: string, text: string) =>
    stage.at(days.instant(days.workingDate(offset), time), async () => {
      await client.call(writeComment, person, {
        params: { lotId },
        body: { clientId: randomUUID(), madeAt: stage.now().toISOString(), text },
      });
    });
  say(-3, '15:10', 'ruben', 'New tee, solvent set overnight before filling. Dry at 24 ft.');
  say(
    -2,
    '17:02',
    'noor',
    'I will open the gauge valve first. Please leave the riser on the cut until I have seen the level.',
  );
  say(-1, '07:24', 'ruben', 'Riser stays. Ladder to the attic is tied off at the hall.');
}

/** Days the departments are off besides weekends; the rule cards start from the federal list. */
function holidaysAround(present: Date): ReadonlySet<string> {
  const years = [present.getUTCFullYear() - 1, present.getUTCFullYear(), present.getUTCFullYear() + 1];
  return new Set(years.flatMap((year) => observedFederalHolidays(year).map((holiday) => holiday.date)));
}
