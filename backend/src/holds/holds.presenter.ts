import { Injectable } from '@nestjs/common';
import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import type { HoldModel } from './hold.model.js';
import { HoldsQueries, type NamedReading } from './holds.queries.js';

/** Shows tests with their logs and the names of those who read. */
@Injectable()
export class HoldsPresenter {
  constructor(private readonly queries: HoldsQueries) {}

  async one(hold: HoldModel): Promise<Hold> {
    return presentHold(hold, await this.queries.listNamedReadings([hold.id]));
  }

  async many(holds: readonly HoldModel[]): Promise<Hold[]> {
    const readings = await this.queries.listNamedReadings(holds.map((hold) => hold.id));
    return holds.map((hold) =>
      presentHold(
        hold,
        readings.filter((reading) => reading.holdId === hold.id),
      ),
    );
  }
}

function presentHold(hold: HoldModel, readings: readonly NamedReading[]): Hold {
  return {
    id: hold.id,
    lotId: hold.lotId,
    unitNumber: hold.unitNumber,
    stageCode: hold.stageCode,
    system: hold.system,
    ordinal: hold.ordinal,
    planId: hold.planId ?? null,
    method: hold.method,
    medium: hold.medium,
    gauge: hold.gauge,
    tape: hold.tape,
    fillLevelFt: hold.fillLevelFt,
    ceilingPsi: hold.ceilingPsi,
    minimumPsi: hold.minimumPsi,
    settleMinutes: hold.settleMinutes,
    state: hold.state,
    startedAt: hold.startedAt.toISOString(),
    endedAt: hold.endedAt?.toISOString() ?? null,
    endReason: hold.endReason,
    readings: readings.map(presentReading),
  };
}

function presentReading({ holdId: _holdId, madeAt, receivedAt, struckAt, ...typed }: NamedReading): Reading {
  return { ...typed, at: madeAt.toISOString(), receivedAt: receivedAt.toISOString(), isStruck: struckAt !== null };
}
