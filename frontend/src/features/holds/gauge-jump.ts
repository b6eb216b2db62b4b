import { countedReadings, type AnalysedTest } from './test-analysis';

export interface GaugeJump {
  /** The last shut reading and the open one right after it. */
  readonly shutAt: string;
  readonly openAt: string;
  readonly fromPsi: number;
  readonly toPsi: number;
}

/** Every time the valve was opened after readings with it shut: what the needle did, oldest first. */
export function gaugeJumps(test: Pick<AnalysedTest, 'readings'>): GaugeJump[] {
  const readings = countedReadings(test);
  return readings.flatMap((reading, index) => {
    const before = readings[index - 1];
    if (before === undefined || before.gaugeValve !== 'shut' || reading.gaugeValve !== 'open') return [];
    if (before.pressurePsi === null || reading.pressurePsi === null) return [];
    return [{ shutAt: before.at, openAt: reading.at, fromPsi: before.pressurePsi, toPsi: reading.pressurePsi }];
  });
}
