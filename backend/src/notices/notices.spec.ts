import ICAL from 'ical.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startMailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { OutboxWorker } from './outbox-worker.service.js';

type Mailbox = Awaited<ReturnType<typeof startMailbox>>;

/** ical.js is an independent reader of RFC 5545. */
function readInvite(text: string) {
  const calendar = new ICAL.Component(ICAL.parse(text));
  const event = calendar.getFirstSubcomponent('vevent');
  if (!event) throw new Error('no event in the calendar file');
  return {
    method: calendar.getFirstPropertyValue('method'),
    uid: event.getFirstPropertyValue('uid'),
    sequence: Number(event.getFirstPropertyValue('sequence')),
    status: event.getFirstPropertyValue('status'),
    start: (event.getFirstPropertyValue('dtstart') as ICAL.Time).toJSDate().toISOString(),
    end: (event.getFirstPropertyValue('dtend') as ICAL.Time).toJSDate().toISOString(),
    location: event.getFirstPropertyValue('location'),
    attendee: String(event.getFirstPropertyValue('attendee')),
    organizer: String(event.getFirstPropertyValue('organizer')),
    rsvp: event.getFirstProperty('attendee')?.getParameter('rsvp'),
  };
}

describe('notices of a visit', () => {
  let mailbox: Mailbox;
  let server: TestApp;
  let world: World;
  let other: TestApp | null = null;

  beforeAll(async () => {
    mailbox = await startMailbox({});
    server = await startTestApp({ environment: { SMTP_URL: mailbox.smtpUrl } });
    world = await createWorld(server);
  });
  afterAll(async () => {
    await other?.close();
    await server?.close();
    await mailbox?.stop();
  });

  const drain = () => server.get(OutboxWorker).drain();
  const request = async (lot: number, date: string, label: string) => {
    const body = { lots: [{ lotId: world.lots[lot]?.id }], stageCode: 'groundwork', date, label };
    const answer = await world.as('superintendent').post('/api/visits', body);
    expect(answer.body).toMatchObject({ visits: [{ state: 'booked' }] });
    return answer.body.visits[0] as { id: string; version: number; window: { startAt: string; endAt: string } };
  };
  const mailsOf = (person: string) =>
    mailbox.messages({ to: `${person}@example.test` }).filter(({ calendars }) => calendars.length > 0);

  it('invites all three parties once, moves the same entry, and takes it away', async () => {
    const visit = await request(0, '2027-03-04', 'mid');
    await drain();
    for (const person of ['superintendent', 'plumber']) {
      const [mail, ...more] = mailsOf(person);
      expect(more).toEqual([]);
      const [part] = mail?.calendars ?? [];
      // RFC 5546 and RFC 6047: the method stands in the content type too
      expect(part).toMatchObject({ contentType: 'text/calendar', method: 'REQUEST' });
      const invite = readInvite(part?.text ?? '');
      expect(invite).toMatchObject({
        method: 'REQUEST',
        status: 'CONFIRMED',
        start: visit.window.startAt,
        end: visit.window.endAt,
        attendee: `mailto:${person}@example.test`,
        organizer: 'mailto:visits@example.test',
        rsvp: 'TRUE',
      });
      // RFC 5545 3.8.7.2: DTSTAMP is in UTC; 3.1: lines end in CRLF and are 75 octets at most
      expect(part?.text).toMatch(/DTSTAMP:\d{8}T\d{6}Z/);
      for (const line of (part?.text ?? '').split(/\r?\n/)) expect(Buffer.byteLength(line)).toBeLessThanOrEqual(75);
    }
    const first = readInvite(mailsOf('plumber')[0]?.calendars[0]?.text ?? '');

    const moved = await world
      .as('superintendent')
      .post(`/api/visits/${visit.id}/move`, { expectedVersion: visit.version, date: '2027-03-08', label: 'early' });
    expect(moved.status).toBe(200);
    await drain();
    const second = readInvite(mailsOf('plumber')[0]?.calendars[0]?.text ?? '');
    expect(second.uid).toBe(first.uid);
    expect(second.sequence).toBeGreaterThan(first.sequence);
    expect(second.start).toBe(moved.body.window.startAt);

    const withdrawn = await world
      .as('superintendent')
      .post(`/api/visits/${visit.id}/withdraw`, { expectedVersion: moved.body.version, reason: 'weather' });
    expect(withdrawn.status).toBe(200);
    await drain();
    const last = readInvite(mailsOf('plumber')[0]?.calendars[0]?.text ?? '');
    expect(last).toMatchObject({ method: 'CANCEL', status: 'CANCELLED', uid: first.uid });
    expect(last.sequence).toBeGreaterThan(second.sequence);
    expect(mailsOf('plumber')).toHaveLength(3);
  });

  it('sends once, in order, after the mail server was away', async () => {
    await mailbox.clear();
    mailbox.setScenario({ mode: 'temporary-failure' });
    const visit = await request(1, '2027-03-09', 'mid');
    await drain();
    const moved = await world
      .as('superintendent')
      .post(`/api/visits/${visit.id}/move`, { expectedVersion: visit.version, date: '2027-03-10', label: 'mid' });
    expect(moved.status).toBe(200);
    await drain();
    expect(mailsOf('plumber')).toEqual([]);
    mailbox.setScenario({ mode: 'accept' });
    for (let tries = 0; tries < 8; tries += 1) {
      server.clock.advance(2);
      await drain();
    }
    const invites = mailsOf('plumber')
      .map(({ calendars }) => readInvite(calendars[0]?.text ?? ''))
      .reverse();
    expect(invites).toHaveLength(2);
    expect(invites[0]?.sequence).toBeLessThan(invites[1]?.sequence ?? 0);
    expect(invites[0]?.start).toBe(visit.window.startAt);
  });

  it('mails once what was committed before the server died', async () => {
    await mailbox.clear();
    await request(2, '2027-03-09', 'late');
    // the first server never drains: another one on the same database, started later, does
    other = await startTestApp({
      database: server.database,
      environment: { SMTP_URL: mailbox.smtpUrl },
      now: server.clock.now().toISOString(),
    });
    await Promise.all([other.get(OutboxWorker).drain(), drain()]);
    await Promise.all([other.get(OutboxWorker).drain(), drain()]);
    expect(mailsOf('plumber')).toHaveLength(1);
    expect(mailsOf('superintendent')).toHaveLength(1);
  });

  it('shows notices on the page to those told, as unread until read', async () => {
    const before = (await world.as('plumber').get('/api/notices')).body;
    expect(before.unread).toBeGreaterThan(0);
    expect(before.items[0]).toMatchObject({ kind: 'visit-booked', params: { lotNumber: '3' } });
    // who did it is not told of it
    expect((await world.as('superintendent').get('/api/notices')).body.items).toEqual([]);
    await world.as('plumber').post('/api/notices/read', { ids: [before.items[0].id] });
    expect((await world.as('plumber').get('/api/notices')).body.unread).toBe(before.unread - 1);
    await world.as('otherPlumber').post('/api/notices/read', {});
    expect((await world.as('plumber').get('/api/notices')).body.unread).toBe(before.unread - 1);
    await world.as('plumber').post('/api/notices/read', {});
    expect((await world.as('plumber').get('/api/notices')).body.unread).toBe(0);
  });

  it('gives up a recipient refused for good, in sight of the operator, who may try again', async () => {
    await mailbox.clear();
    mailbox.setScenario({ mode: 'reject-recipient', recipients: ['plumber@example.test'] });
    await request(3, '2027-03-11', 'mid');
    await drain();
    const pile = (await world.as('operator').get('/api/operations/deliveries?state=given-up')).body;
    expect(pile.items).toEqual([expect.objectContaining({ to: 'plumber@example.test', state: 'given-up' })]);
    mailbox.setScenario({ mode: 'accept' });
    await world.as('operator').post(`/api/operations/deliveries/${pile.items[0].id}/retry`);
    await drain();
    expect(mailsOf('plumber')).toHaveLength(1);
  });

  it('tells a lot whose words carry signs of markup without making any', async () => {
    await mailbox.clear();
    await server.db.query(`UPDATE lots SET address = '<b>12</b> & Co' WHERE id = '${world.lots[4].id}'`);
    await request(4, '2027-03-11', 'noon');
    await drain();
    const [mail] = mailsOf('plumber');
    expect(mail?.html).toContain('&lt;b&gt;12&lt;/b&gt; &amp; Co');
    expect(mail?.text).toContain('<b>12</b> & Co');
  });
});
