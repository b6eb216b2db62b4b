import { type z } from 'zod';
import { list, optional, positive, strict } from './field-kinds.js';
import { hydraulicLimits } from './hydraulic-limits.js';
import { isAbove } from './tolerance.js';

/** Up to a test pressure (none: any) the gauge shows steps of so many psi, or of a percentage of the test pressure. */
export const gaugeIncrementRow = strict({
  upToPsi: optional(positive),
  incrementPsi: optional(positive),
  percent: optional(positive),
}).refine((row) => (row.incrementPsi === null) !== (row.percent === null), 'increment-or-percent');
export type GaugeIncrementRow = z.output<typeof gaugeIncrementRow>;

export const gaugeIncrements = optional(list(gaugeIncrementRow, hydraulicLimits.gaugeRows));

/** IRC P2503.9: up to 10 psi steps of 0.1, up to 100 psi of 1, above of 2 %. */
export const modelGaugeIncrements: readonly GaugeIncrementRow[] = [
  { upToPsi: 10, incrementPsi: 0.1, percent: null },
  { upToPsi: 100, incrementPsi: 1, percent: null },
  { upToPsi: null, incrementPsi: null, percent: 2 },
];

/** The coarsest step in psi that a gauge may have for a test at `testPsi`: the first row that reaches it, else the last. */
export function requiredIncrementPsi(testPsi: number, rows: readonly GaugeIncrementRow[] | null): number {
  const table = rows && rows.length > 0 ? rows : modelGaugeIncrements;
  const row = table.find(({ upToPsi }) => upToPsi === null || !isAbove(testPsi, upToPsi)) ?? table[table.length - 1];
  return row?.incrementPsi ?? (testPsi * (row?.percent ?? 0)) / 100;
}
