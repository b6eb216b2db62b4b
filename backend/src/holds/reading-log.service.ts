import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { GaugeValve } from '@holdwater/shared-types/holds/hold.states.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { Ledger } from '../ledger/ledger.service.js';
import type { HoldModel } from './hold.model.js';
import { ReadingModel } from './reading.model.js';
import { checkReading } from './reading.rules.js';

/** A reading as typed, its time already corrected by the clock of the request. */
export interface NewReading {
  readonly clientId: string;
  readonly madeAt: Date;
  readonly pressurePsi?: number | null;
  readonly levelIn?: number | null;
  readonly temperatureF?: number | null;
  readonly gaugeValve?: GaugeValve | null;
  readonly note?: string | null;
}

export type ReadingRole = ReadingModel['byRole'];

/** Appends to the log of a test whose row the caller has locked. Never edits. */
@Injectable()
export class ReadingLog {
  constructor(
    @InjectModel(ReadingModel) private readonly readings: typeof ReadingModel,
    private readonly clock: Clock,
    private readonly ledger: Ledger,
    private readonly changes: Changes,
  ) {}

  /**
   * Adds a reading, or gives the one that was already added under its client id. One made while the test still stood is taken late too.
   * `path` leads to it inside the input, with its dot.
   * @throws bad-input, reading-out-of-gauge, hold-ended
   */
  async append(hold: HoldModel, typed: NewReading, actor: Actor, role: ReadingRole, path = ''): Promise<ReadingModel> {
    const repeated = await this.findRepeated(hold, typed.clientId, path);
    if (repeated !== null) return repeated;
    checkReading(hold, typed, path);
    if (hold.endedAt !== null && typed.madeAt > hold.endedAt) refuse('hold-ended', { endReason: hold.endReason });
    const reading = await this.readings.create({
      id: randomUUID(),
      clientId: typed.clientId,
      holdId: hold.id,
      madeAt: typed.madeAt,
      receivedAt: await this.nextArrival(hold),
      pressurePsi: typed.pressurePsi ?? null,
      levelIn: typed.levelIn ?? null,
      temperatureF: typed.temperatureF ?? null,
      gaugeValve: typed.gaugeValve ?? null,
      note: typed.note ?? null,
      byPerson: actor.personId,
      byRole: role,
    });
    await this.record(hold, reading, actor, role);
    return reading;
  }

  /** Now, but after whatever this log got before: of readings made at one moment the order they came in decides. */
  private async nextArrival(hold: HoldModel): Promise<Date> {
    const last = await this.readings.findOne({ where: { holdId: hold.id }, order: [['receivedAt', 'DESC']] });
    return new Date(Math.max(this.clock.now().getTime(), last === null ? 0 : last.receivedAt.getTime() + 1));
  }

  /** A client id names one entry for ever: of this test it is the same entry again, of another it is a fault of the client. */
  private async findRepeated(hold: HoldModel, clientId: string, path: string): Promise<ReadingModel | null> {
    const earlier = await this.readings.findOne({ where: { clientId } });
    if (earlier !== null && earlier.holdId !== hold.id) refuse('bad-input', {}, { [`${path}clientId`]: 'used-before' });
    return earlier;
  }

  private async record(hold: HoldModel, reading: ReadingModel, actor: Actor, role: ReadingRole): Promise<void> {
    const { pressurePsi, levelIn, gaugeValve } = reading;
    const madeAt = reading.madeAt.toISOString();
    await this.ledger.appendToLot(
      hold.lotId,
      'reading-added',
      { holdId: hold.id, system: hold.system, readingId: reading.id, pressurePsi, levelIn, gaugeValve, madeAt },
      { personId: actor.personId, role },
    );
    this.changes.lot(hold.lotId, 'holds', 'visits');
  }
}
