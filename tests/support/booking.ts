import type { OfferedWindow, VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { SeededDatabase } from './seeded-database.js';

/** The first stage of a house: every new lot may ask for it. */
export const stageCode = 'groundwork';

export interface Answered<Body> {
  status: number;
  body: Body;
}

/**
 * Windows a lot can ask for now, soonest first. Those of the first day are left out: its cut-off may pass while a test runs.
 */
export async function listTakeable(seeded: SeededDatabase, url: string, lotId: string): Promise<OfferedWindow[]> {
  const answer = await seeded.as('superintendent', url).post('/api/visits/offers', { lots: [{ lotId }], stageCode });
  if (answer.status !== 200) throw new Error(`no offers: ${JSON.stringify(answer.body)}`);
  const { windows, firstDate } = answer.body as { windows: OfferedWindow[]; firstDate: string };
  return windows.filter(({ isTakeable, date }) => isTakeable && date > firstDate);
}

type Wanted = Pick<OfferedWindow, 'date' | 'label'>;

/** Asks for a window of one lot, whatever the answer; the same key is the same request. */
export async function ask(seeded: SeededDatabase, url: string, lotId: string, { date, label }: Wanted, key?: string) {
  const body = { lots: [{ lotId }], stageCode, date, label };
  const { status, body: answer } = await seeded.as('superintendent', url).post('/api/visits', body, { key });
  return { status, body: answer } as Answered<Record<string, unknown>>;
}

/** Books the window for a lot, or fails. */
export async function book(seeded: SeededDatabase, url: string, lotId: string, wanted: Wanted): Promise<VisitSummary> {
  const { status, body } = await ask(seeded, url, lotId, wanted);
  const [visit] = (body.visits ?? []) as VisitSummary[];
  if (status !== 201 || visit?.state !== 'booked') throw new Error(`not booked: ${JSON.stringify(body)}`);
  return visit;
}

/** The addresses of the three who must be at a visit of the first set, sorted. */
export function listInvited({ world }: SeededDatabase, visit: VisitSummary): string[] {
  const { superintendent, plumber, ...others } = world.people;
  const inspector = Object.values(others).find(({ id }) => id === visit.inspector?.id);
  if (!inspector) throw new Error('the visit has no inspector');
  return [superintendent, plumber, inspector].map(({ email }) => email).sort();
}
