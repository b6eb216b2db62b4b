import { randomUUID } from 'node:crypto';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import type { addReading, Hold, startHold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotModel } from '../lots/lot.model.js';
import { asOwner } from '../testing/fixtures/visits.js';
import type { World, WorldPerson } from '../testing/fixtures/world.js';
import type { TestApp } from '../testing/test-app.js';
import { VisitModel } from '../visits/visit.model.js';

export type StartBody = RouteCall<typeof startHold>['body'];
export type ReadingBody = RouteCall<typeof addReading>['body'];

/** Windows of the test's own Tuesday in Denver (UTC−7); the tests' present, 9:30 am, lies inside `mid`. */
const windows = {
  early: ['2027-03-02T14:30:00Z', '2027-03-02T16:00:00Z'],
  mid: ['2027-03-02T16:00:00Z', '2027-03-02T18:00:00Z'],
  noon: ['2027-03-02T18:00:00Z', '2027-03-02T20:00:00Z'],
  late: ['2027-03-02T20:30:00Z', '2027-03-02T22:30:00Z'],
} as const;

export interface VisitWish {
  label?: keyof typeof windows;
  stageCode?: string;
  inspector?: WorldPerson;
  unitNumbers?: number[];
  state?: 'booked' | 'ready' | 'underway';
  /** When the inspector is planned for, half an hour long; a time of its own for every visit unless given. */
  plannedAt?: string;
}

/** What the tests of holds and outcomes are made of, without leaning on how visits are booked. */
export class HoldScenario {
  private visits = 0;

  constructor(
    readonly server: TestApp,
    readonly world: World,
  ) {}

  /** A client id and the present, or some minutes before it. */
  stamp(minutesAgo = 0): { clientId: string; madeAt: string } {
    const at = this.server.clock.now().getTime() - minutesAgo * 60_000;
    return { clientId: randomUUID(), madeAt: new Date(at).toISOString() };
  }

  level(levelIn: number, minutesAgo = 0): ReadingBody {
    return { ...this.stamp(minutesAgo), levelIn };
  }

  pressure(pressurePsi: number, gaugeValve: 'open' | 'shut' = 'open', minutesAgo = 0): ReadingBody {
    return { ...this.stamp(minutesAgo), pressurePsi, gaugeValve };
  }

  dwvBody(overrides: Partial<StartBody> = {}): StartBody {
    return {
      ...this.stamp(),
      unitNumber: 1,
      stageCode: 'rough-in',
      system: 'dwv',
      method: 'stack-to-roof',
      medium: 'water',
      tape: { incrementIn: 0.125 },
      fillLevelFt: 24,
      firstReading: this.level(2),
      ...overrides,
    };
  }

  waterBody(overrides: Partial<StartBody> = {}): StartBody {
    return {
      ...this.stamp(),
      unitNumber: 1,
      stageCode: 'rough-in',
      system: 'water',
      method: 'gauge',
      medium: 'water',
      gauge: { rangePsi: 200, incrementPsi: 2 },
      ceilingPsi: 160,
      firstReading: this.pressure(120),
      ...overrides,
    };
  }

  async start(lot: LotModel, body: StartBody): Promise<Hold> {
    const answer = await this.world.as('plumber').post(`/api/lots/${lot.id}/holds`, body).expect(201);
    return answer.body as Hold;
  }

  /** Both systems of the rough-in standing. */
  async standUp(lot: LotModel, unitNumber = 1): Promise<{ dwv: Hold; water: Hold }> {
    const dwv = await this.start(lot, this.dwvBody({ unitNumber }));
    const water = await this.start(lot, this.waterBody({ unitNumber }));
    return { dwv, water };
  }

  /** Every window of the rule card takes as many visits as a test of these makes in it. */
  private async makeRoom(): Promise<void> {
    const sql = `UPDATE rule_cards SET content = jsonb_set(content, '{asking,windows}', (SELECT jsonb_agg(w || '{"room": 50}')
      FROM jsonb_array_elements(content -> 'asking' -> 'windows') w)) WHERE id = $1`;
    await asOwner(this.server, sql, [this.world.ruleCard.id]);
  }

  async visit(lot: LotModel, wish: VisitWish = {}): Promise<VisitModel> {
    const {
      label = 'mid',
      stageCode = 'rough-in',
      inspector = 'inspector',
      unitNumbers = [1],
      state = 'booked',
    } = wish;
    const now = this.server.clock.now();
    const [startAt, endAt] = windows[label].map((at) => new Date(at)) as [Date, Date];
    this.visits += 1;
    if (this.visits === 1) await this.makeRoom();
    const from = wish.plannedAt
      ? Date.parse(wish.plannedAt)
      : Date.parse('2027-03-02T00:00:00Z') + this.visits * 30 * 60_000;
    return VisitModel.create({
      id: randomUUID(),
      lotId: lot.id,
      departmentId: lot.departmentId,
      ruleCardId: this.world.ruleCard.id,
      stageCode,
      unitNumbers,
      state,
      version: 0,
      windowDate: '2027-03-02',
      windowLabel: label,
      window: [startAt, endAt],
      place: this.visits,
      inspectorId: this.world.people[inspector].id,
      planned: [new Date(from), new Date(from + 30 * 60_000)],
      requestedBy: this.world.people.superintendent.id,
      requestingSide: 'builder',
      requestedAt: now,
      readyAt: state === 'booked' ? null : now,
      ...(state === 'underway' && { begunAt: now, begunBy: this.world.people[inspector].id, begunFrom: 'ready' }),
      calendarUid: randomUUID(),
      createdAt: now,
    });
  }
}
