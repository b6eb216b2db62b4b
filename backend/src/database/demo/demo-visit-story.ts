import { randomUUID } from 'node:crypto';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { addReading, endHold, startHold, type Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { DwvMethod, Medium } from '@holdwater/shared-types/holds/hold.states.js';
import { fixCorrection, recordOutcome, type NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import {
  beginVisit,
  declineVisit,
  moveVisit,
  placeVisit,
  requestVisits,
  sayTestUp,
  withdrawVisit,
  type VisitSummary,
} from '@holdwater/shared-types/visits/visit.contract.js';
import { Temporal } from 'temporal-polyfill';
import type { DemoClient } from './demo-client.js';
import type { DemoDays } from './demo-days.js';
import { findDemoPlan } from './demo-plans.js';
import type { DemoStage } from './demo-stage.js';

type OutcomeResult = RouteCall<typeof recordOutcome>['body']['result'];

/** A correction of the story, without what is the same for all. */
export type DemoCorrection = Pick<NewCorrection, 'subject' | 'text' | 'severity'> & Partial<NewCorrection>;

export interface DemoVisitPlan {
  stage: string;
  /** Working days from today. */
  day: number;
  window: string;
  systems: Array<'dwv' | 'water'>;
  method: DwvMethod;
  medium?: Medium;
  /** What the gauge stands at in the evening and in the morning. */
  psi?: [number, number];
  levelFt?: number;
  /** `all`: said up in the morning; `early`: said up the evening before; `dwv`: water is missing; `none`. */
  up: 'all' | 'early' | 'dwv' | 'none';
  result?:
    | { kind: 'pass' }
    | { kind: 'fail'; corrections: DemoCorrection[] }
    | Extract<OutcomeResult, { kind: 'not-ready' | 'no-access' }>;
  ends?: { kind: 'withdrawn' | 'declined'; why: string };
  isUnplaced?: boolean;
  inspector?: string;
  /** Corrections of the visit before are fixed this many working days after it. */
  fixesBefore?: number;
}

export interface DemoLotPeople {
  superintendent: string;
  plumber: string;
  desk: string;
  /** Person key by name. */
  inspectors: Record<string, string>;
}

export interface DemoLotState {
  lotId: string;
  units: number[];
  openCorrections: Array<{ id: string; version: number }>;
}

/** Tells one visit of one lot: request, test, arrival, outcome. */
export class DemoVisitStory {
  private visit: VisitSummary | null = null;
  private holds: Hold[] = [];
  private fixed: string[] = [];

  constructor(
    private readonly client: DemoClient,
    private readonly stage: DemoStage,
    private readonly days: DemoDays,
    private readonly people: DemoLotPeople,
    private readonly lot: DemoLotState,
    private readonly plan: DemoVisitPlan,
    private readonly daysAhead: number,
    /** Spreads the acts of one day, in minutes. */
    private readonly spread: number,
    private readonly personIdOf: (key: string) => string,
  ) {}

  tell(): void {
    const { plan, days } = this;
    const date = days.workingDate(plan.day);
    const askedOn = days.before(date, this.daysAhead + 1);
    const eve = days.before(date, 1);
    if (plan.fixesBefore !== undefined) this.at(askedOn, '08:30', () => this.fix());
    this.at(askedOn, '09:40', () => this.request(date));
    if (plan.ends) {
      this.at(eve, '11:10', () => this.end(plan.ends));
      return;
    }
    if (plan.up !== 'none') {
      this.at(eve, '15:20', () => this.startTests());
      this.at(eve, '18:30', () => this.readAgain(0));
      if (plan.up === 'early') this.at(eve, '18:40', () => this.sayUp());
      this.at(date, '05:50', () => this.readAgain(1));
      if (plan.up === 'all') this.at(date, '06:00', () => this.sayUp());
    }
  }

  private at(date: string, time: string, play: () => Promise<void>): void {
    const instant = this.days.instant(date, time);
    this.stage.at(new Date(instant.getTime() + this.spread * 60_000), play);
  }

  private async request(date: string): Promise<void> {
    const { visits } = await this.client.call(requestVisits, this.people.superintendent, {
      body: {
        lots: [{ lotId: this.lot.lotId, unitNumbers: this.lot.units }],
        stageCode: this.plan.stage,
        date,
        label: this.labelOn(date),
      },
    });
    this.visit = visits[0] ?? null;
    if (this.visit?.state === 'requested' && !this.plan.isUnplaced && this.plan.ends?.kind !== 'declined') {
      this.stage.at(new Date(Date.parse(this.visit.requestedAt) + 90 * 60_000), () => this.place(date));
    } else if (this.visit?.state === 'booked') {
      await this.giveTo(date);
      this.planArrival();
    }
  }

  private async place(date: string): Promise<void> {
    const visit = this.known();
    this.visit = await this.client.call(placeVisit, this.people.desk, {
      params: { visitId: visit.id },
      body: { expectedVersion: visit.version, date, label: this.labelOn(date) },
    });
    this.planArrival();
  }

  private async giveTo(date: string): Promise<void> {
    const visit = this.known();
    if (!this.plan.inspector || visit.inspector?.id === this.personIdOf(this.plan.inspector)) return;
    this.visit = await this.client.call(moveVisit, this.people.desk, {
      params: { visitId: visit.id },
      body: {
        expectedVersion: visit.version,
        date,
        label: this.labelOn(date),
        inspectorId: this.personIdOf(this.plan.inspector),
      },
    });
  }

  /** Some windows are Monday to Thursday only; on another day the visit comes in the morning. */
  private labelOn(date: string): string {
    const isShortDay = Temporal.PlainDate.from(date).dayOfWeek > 4;
    return isShortDay && ['midday', 'afternoon'].includes(this.plan.window) ? 'morning' : this.plan.window;
  }

  private planArrival(): void {
    const start = Date.parse(this.known().plannedStartAt ?? this.known().window.startAt);
    if (!this.plan.result || this.plan.ends) return;
    this.stage.at(new Date(start + 60_000), () => this.begin());
    this.stage.at(new Date(start + 14 * 60_000), () => this.close());
  }

  private async startTests(): Promise<void> {
    for (const unitNumber of this.lot.units) {
      for (const system of this.plan.systems) {
        if (system === 'water' && this.plan.up === 'dwv') continue;
        this.holds.push(await this.startTest(unitNumber, system));
      }
    }
  }

  private async startTest(unitNumber: number, system: 'dwv' | 'water'): Promise<Hold> {
    const write = this.write();
    const isWater = system === 'water';
    const { stage: stageCode } = this.plan;
    const method = isWater ? 'gauge' : this.plan.method;
    const medium = isWater ? (this.plan.medium ?? 'water') : this.plan.method === 'air' ? 'air' : 'water';
    const part = { lotId: this.lot.lotId, unitNumber, stageCode, system, method, medium } as const;
    const plan = await findDemoPlan(this.client, this.people.plumber, part, this.stage.now());
    return this.client.call(startHold, this.people.plumber, {
      params: { lotId: this.lot.lotId },
      body: {
        ...write,
        unitNumber,
        stageCode: this.plan.stage,
        system,
        method,
        medium,
        planId: plan?.id ?? null,
        isSuperseding: true,
        ...(isWater
          ? {
              gauge: { rangePsi: 200, incrementPsi: 1 },
              // a plan brings the ceiling of this very house
              ...(plan === null && { ceilingPsi: medium === 'water' ? 180 : 80 }),
            }
          : { tape: { incrementIn: 0.25 }, ...(plan === null && { fillLevelFt: this.plan.levelFt ?? 21 }) }),
        firstReading: this.reading(system, 0),
      },
    });
  }

  private async readAgain(which: 0 | 1): Promise<void> {
    for (const hold of this.holds) {
      await this.client.call(addReading, this.people.plumber, {
        params: { holdId: hold.id },
        body: this.reading(hold.system, which),
      });
    }
  }

  private reading(system: 'dwv' | 'water', which: 0 | 1) {
    const temperatureF = which === 0 ? 61 : 48;
    if (system === 'dwv') return { ...this.write(), levelIn: 0, temperatureF };
    return {
      ...this.write(),
      pressurePsi: (this.plan.psi ?? [118, 116])[which],
      gaugeValve: 'open' as const,
      temperatureF,
    };
  }

  private async sayUp(): Promise<void> {
    const visit = this.known();
    this.visit = await this.client.call(sayTestUp, this.people.plumber, {
      params: { visitId: visit.id },
      body: { expectedVersion: visit.version, ...this.write() },
    });
  }

  private async begin(): Promise<void> {
    const visit = this.known();
    this.visit = await this.client.call(beginVisit, this.inspectorKey(), {
      params: { visitId: visit.id },
      body: { expectedVersion: visit.version, ...this.write() },
    });
  }

  private async close(): Promise<void> {
    const visit = this.known();
    const answer = await this.client.call(recordOutcome, this.inspectorKey(), {
      params: { visitId: visit.id },
      body: { expectedVersion: visit.version, ...this.write(), result: this.result() },
    });
    this.visit = answer.visit;
    this.lot.openCorrections = answer.corrections
      .filter((each) => each.state === 'open')
      .map(({ id, version }) => ({ id, version }));
    if (this.plan.result?.kind === 'pass')
      this.stage.at(new Date(this.stage.now().getTime() + 45 * 60_000), () => this.takeDown());
  }

  private result(): OutcomeResult {
    const result = this.plan.result;
    if (result?.kind === 'not-ready' || result?.kind === 'no-access') return result;
    const corrections = result?.kind === 'fail' ? result.corrections : [];
    const failed = new Set(
      corrections.filter((each) => each.severity === 'fix-before-cover').map((each) => each.subject),
    );
    return {
      kind: 'seen',
      systems: this.lot.units.flatMap((unitNumber) =>
        this.plan.systems.map((system) => ({
          unitNumber,
          system,
          answer: failed.has(system) ? ('fail' as const) : ('pass' as const),
          ...(system === 'water' && { needle: 'stayed' as const, pressurePsi: (this.plan.psi ?? [118, 116])[1] }),
        })),
      ),
      lookedAt: this.lookedAt(),
      corrections: corrections.map((each) => ({
        clientId: randomUUID(),
        unitNumber: 1,
        place: 'whole-system' as const,
        ...each,
      })),
      accepted: this.fixed,
      reopened: [],
    };
  }

  /** At a pass every point of the work is looked at; at a fail the inspector leaves some for the next time. */
  private lookedAt(): string[] {
    const below = ['permit-on-site', 'hangers', 'slope', 'cleanouts', 'trap-arms', 'sleeves'];
    const isBelowSlab = this.plan.stage === 'groundwork' || this.plan.stage === 'under-slab';
    return isBelowSlab || this.plan.result?.kind === 'fail' ? below : [...below, 'nail-plates', 'framing'];
  }

  private async fix(): Promise<void> {
    for (const correction of this.lot.openCorrections) {
      await this.client.call(fixCorrection, this.people.plumber, {
        params: { correctionId: correction.id },
        body: {
          expectedVersion: correction.version,
          ...this.write(),
          note: 'Cut out, new fitting glued in, dry overnight.',
        },
      });
      this.fixed.push(correction.id);
    }
    this.lot.openCorrections = [];
  }

  private async end(end: DemoVisitPlan['ends']): Promise<void> {
    const visit = this.known();
    const params = { visitId: visit.id };
    if (end?.kind === 'declined') {
      await this.client.call(declineVisit, this.people.desk, {
        params,
        body: { expectedVersion: visit.version, reason: end.why },
      });
    } else if (end) {
      await this.client.call(withdrawVisit, this.people.superintendent, {
        params,
        body: { expectedVersion: visit.version, reason: 'weather', note: end.why },
      });
    }
  }

  private async takeDown(): Promise<void> {
    for (const hold of this.holds.filter((each) => each.system === 'dwv')) {
      await this.client.call(endHold, this.people.plumber, {
        params: { holdId: hold.id },
        body: { ...this.write(), reason: 'taken-down' },
      });
    }
  }

  private inspectorKey(): string {
    const name = this.known().inspector?.name ?? '';
    const key = this.people.inspectors[name];
    if (!key) throw new Error(`no demo person for inspector ${name}`);
    return key;
  }

  private known(): VisitSummary {
    if (!this.visit) throw new Error('the visit was not requested yet');
    return this.visit;
  }

  private write() {
    return { clientId: randomUUID(), madeAt: this.stage.now().toISOString() };
  }
}
