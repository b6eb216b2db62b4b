import { answerHandover, askHandover } from '@holdwater/shared-types/lots/handover.contract.js';
import type { DemoClient } from './demo-client.js';
import type { DemoDays } from './demo-days.js';
import type { DemoFoundation } from './demo-foundation.js';
import type { DemoStage } from './demo-stage.js';

/** Lots that Two Bells leaves to Merrow: asked, and answered unless it still waits. Working days from today. */
const handovers: Readonly<Record<string, { number: string; askedOn: number; answeredOn: number | null }>> = {
  ashquill: { number: '2207', askedOn: -8, answeredOn: -7 },
  corrow: { number: '7', askedOn: -1, answeredOn: null },
};

/** One lot handed over to another plumber, with what the first keeps to read, and one that waits for the answer. */
export function tellHandover(
  client: DemoClient,
  stage: DemoStage,
  foundation: DemoFoundation,
  days: DemoDays,
  department: string,
  lotIds: ReadonlyMap<string, string>,
): void {
  const told = handovers[department];
  if (!told) return;
  const lotId = lotIds.get(told.number) ?? '';
  const successor = foundation.organizationId('merrow');
  stage.at(days.instant(days.workingDate(told.askedOn), '10:20'), async () => {
    await client.call(askHandover, 'della', {
      params: { lotId },
      body: { kind: 'plumber', organizationId: successor },
    });
  });
  if (told.answeredOn === null) return;
  stage.at(days.instant(days.workingDate(told.answeredOn), '08:05'), async () => {
    const body = { organizationId: successor, isJoining: true };
    await client.call(answerHandover, 'sunniva', { params: { lotId }, body });
  });
}
