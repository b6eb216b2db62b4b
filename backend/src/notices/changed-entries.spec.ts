import ICAL from 'ical.js';
import { startMailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { LotModel } from '../lots/lot.model.js';
import { addLots, book } from '../testing/fixtures/visits.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { OutboxWorker } from './outbox-worker.service.js';

/** ical.js is an independent reader of RFC 5545. */
function readInvite(text: string) {
  const calendar = new ICAL.Component(ICAL.parse(text));
  const event = calendar.getFirstSubcomponent('vevent');
  if (!event) throw new Error('no event in the calendar file');
  const value = (name: string) => event.getFirstPropertyValue(name);
  return {
    method: calendar.getFirstPropertyValue('method'),
    uid: value('uid'),
    sequence: Number(value('sequence')),
    start: (value('dtstart') as ICAL.Time).toJSDate().toISOString(),
    location: value('location'),
    summary: String(value('summary')),
  };
}

let mailbox: Awaited<ReturnType<typeof startMailbox>>;
let server: TestApp;
let world: World;
let nextDate = 7;

beforeAll(async () => {
  mailbox = await startMailbox({});
  server = await startTestApp({ environment: { SMTP_URL: mailbox.smtpUrl } });
  world = await createWorld(server);
});
afterAll(async () => {
  await server?.close();
  await mailbox?.stop();
});
beforeEach(() => mailbox.clear());

const drain = () => server.get(OutboxWorker).drain();
/** Oldest first. */
const invitesOf = (person: string) =>
  mailbox
    .messages({ to: `${person}@example.test` })
    .flatMap(({ calendars }) => calendars.map(({ text }) => readInvite(text)))
    .reverse();
/** A lot with a booked visit that all three parties have in their calendars. */
const bookedLot = async () => {
  const [lot] = await addLots(server, world, 1);
  nextDate += 1;
  const visit = await book(world, lot as LotModel, {
    stageCode: 'groundwork',
    date: `2027-03-${String(nextDate).padStart(2, '0')}`,
    label: 'mid',
  });
  await drain();
  return { lot: lot as LotModel, visit };
};
const change = (lot: LotModel, body: object) =>
  world.as('superintendent').patch(`/api/lots/${lot.id}`, body).expect(200);

// RFC 5546 §2.1.4: an update has the UID of what it updates and a higher SEQUENCE
describe('what an invite says changes though its window stays', () => {
  it('sends the same entry anew, to all who have it, with the new address', async () => {
    const { lot, visit } = await bookedLot();
    const [first] = invitesOf('plumber');
    await change(lot, { address: '99 Heron Walk' });
    await drain();
    const inspector = visit.inspector?.id === world.people.inspector.id ? 'inspector' : 'secondInspector';
    for (const person of ['plumber', 'superintendent', world.people[inspector].email.split('@')[0] ?? '']) {
      const [was, is, ...more] = invitesOf(person);
      if (!was) throw new Error(`${person} was not invited`);
      expect(more).toEqual([]);
      expect(is).toMatchObject({
        method: 'REQUEST',
        uid: was.uid,
        location: '99 Heron Walk',
        start: visit.window.startAt,
      });
      expect(is?.sequence).toBeGreaterThan(was.sequence);
    }
    expect(invitesOf('plumber')).toHaveLength(2);
    // and a later cancellation is higher still
    const { body } = await world.as('superintendent').get(`/api/visits/${visit.id}`);
    const end = { expectedVersion: body.version, reason: 'weather' };
    await world.as('superintendent').post(`/api/visits/${visit.id}/withdraw`, end).expect(200);
    await drain();
    const [, changed, cancelled] = invitesOf('plumber');
    expect(cancelled).toMatchObject({ method: 'CANCEL', uid: first?.uid });
    expect(cancelled?.sequence).toBeGreaterThan(changed?.sequence ?? 0);
  });

  it('does so for a new lot number and a new name of the tract, which stand in the summary', async () => {
    const { lot } = await bookedLot();
    await change(lot, { number: `${lot.number}B` });
    await drain();
    expect(invitesOf('plumber').at(-1)?.summary).toContain(`Lot ${lot.number}B`);
    await world
      .as('superintendent')
      .patch(`/api/tracts/${world.tract.id}`, { name: 'Quillback Rise, phase 2' })
      .expect(200);
    await drain();
    expect(invitesOf('plumber').map(({ summary }) => summary.includes('phase 2'))).toEqual([false, false, true]);
  });

  it('sends nothing where the invite says the same: a gate code, a permit, the address as it was', async () => {
    const { lot } = await bookedLot();
    const access = { gateCode: '4411', contactName: null, contactPhone: null, hazards: 'Open trench' };
    await change(lot, { access, permit: { number: 'P-1', status: 'issued', holder: null }, address: lot.address });
    await drain();
    expect(invitesOf('plumber')).toHaveLength(1);
  });
});

// product: "invites follow"
describe('a plumber replaced', () => {
  it('gives the new one the same entry with a higher SEQUENCE and takes it from the old one', async () => {
    const { lot } = await bookedLot();
    const [first] = invitesOf('plumber');
    const organizationId = world.organizations.otherPlumber.id;
    await world
      .as('superintendent')
      .post(`/api/lots/${lot.id}/handovers`, { kind: 'plumber', organizationId })
      .expect(200);
    await world
      .as('otherPlumber')
      .post(`/api/lots/${lot.id}/handovers/answer`, { organizationId, isJoining: true })
      .expect(200);
    await drain();
    const gone = invitesOf('plumber').at(-1);
    expect(gone).toMatchObject({ method: 'CANCEL', uid: first?.uid });
    expect(gone?.sequence).toBeGreaterThan(first?.sequence ?? 0);
    const [come, ...more] = invitesOf('otherplumber');
    expect(more).toEqual([]);
    expect(come).toMatchObject({ method: 'REQUEST', uid: first?.uid, sequence: gone?.sequence });
    const told = mailbox.messages({ to: 'plumber@example.test' }).map(({ subject }) => subject);
    expect(told).toContainEqual(expect.stringContaining('handed over from'));
    // what happens to the visit later is not told to who left
    const count = invitesOf('plumber').length;
    await change(lot, { address: '7 Later Lane' });
    await drain();
    expect(invitesOf('plumber')).toHaveLength(count);
  });
});
