import { startMailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { PersonModel } from '../accounts/person.model.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { book } from '../testing/fixtures/visits.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { changesForVisits } from './expand/rule-card-news.js';
import { OutboxWorker } from './outbox-worker.service.js';

let mailbox: Awaited<ReturnType<typeof startMailbox>>;
let server: TestApp;
let world: World;

beforeAll(async () => {
  mailbox = await startMailbox({});
  server = await startTestApp({ environment: { SMTP_URL: mailbox.smtpUrl } });
  world = await createWorld(server);
  await PersonModel.update({ locale: 'es' }, { where: { id: world.people.plumber.id } });
  await book(world, world.lots[0], { stageCode: 'groundwork' });
  await server.get(OutboxWorker).drain();
});
afterAll(async () => {
  await server?.close();
  await mailbox?.stop();
});
beforeEach(() => mailbox.clear());

const publish = async (change: (card: RuleCard) => RuleCard['content'], effectiveFrom: string) => {
  const desk = world.as('desk');
  const path = `/api/departments/${world.organizations.department.id}/rule-cards`;
  const card = (await desk.post(path).expect(201)).body as RuleCard;
  await desk.put(`/api/rule-cards/${card.id}`, { content: change(card) }).expect(200);
  await desk.post(`/api/rule-cards/${card.id}/publish`, { effectiveFrom }).expect(200);
  await server.get(OutboxWorker).drain();
  return card;
};
const mailsOf = (person: WorldPerson) => mailbox.messages({ to: `${person}@example.test` });

// definitions, notices: "rule card changed (those with an open visit)"; issue: "what changed for them"
describe('a rule card that changed', () => {
  it('is told to those with an open visit, each what changes for their stage, in their language', async () => {
    const card = await publish(
      ({ content }) => ({
        ...content,
        readiness: { ...content.readiness, upBy: { kind: 'clock-time', time: '06:30' } },
        tests: content.tests.map((test) => ({ ...test, standMinutes: test.stageCode === 'groundwork' ? 30 : 45 })),
      }),
      '2027-03-08',
    );
    const [mail, ...more] = mailsOf('superintendent');
    expect(more).toEqual([]);
    expect(mail?.subject).toBe('Tallowmere: rule card 2 from Mon, Mar 8');
    expect(mail?.text).toContain('Test up, Up by: 6:30 am on the day (before: 1 h before the window opens)');
    expect(mail?.text).toContain('Groundwork, DWV, To stand: 30 min (before: 15 min)');
    // no visit of theirs is at that stage
    expect(mail?.text).not.toContain('Rough-in');
    expect(mail?.text).toContain('stay on the rule card they have');
    expect(mail?.text).toContain(`/rule-cards/${card.id}`);
    const [spanish] = mailsOf('plumber');
    expect(spanish?.subject).toMatch(/^Tallowmere: hoja de reglas 2 desde /);
    expect(spanish?.text).toContain('Drenaje bajo losa, DWV, Tiempo en pie: 30 min (antes: 15 min)');
    expect(mailsOf('otherSuperintendent')).toEqual([]);
    expect(mailsOf('desk')).toEqual([]);
  });

  it('stands on the page in both languages, for the inspectors against the version before', async () => {
    const { body } = await world.as('inspector').get('/api/notices').expect(200);
    expect(body.items[0]).toMatchObject({ kind: 'rule-card-published', params: { departmentName: 'Tallowmere' } });
    // the two rows that differ between versions 1 and 2 by hand: up by, and the time of three tests
    const { sentences, more } = body.items[0].params.changes;
    expect(more).toBe(0);
    expect(sentences.en).toHaveLength(4);
    expect(sentences.es).toHaveLength(4);
    expect(sentences.en.some((each: string) => each.startsWith('Rough-in, Water'))).toBe(true);
  });

  it('says so where it changes nothing for the reader’s stages', async () => {
    await publish(
      ({ content }) => ({
        ...ruleCardContent(),
        tests: content.tests.map((test) => ({ ...test, standMinutes: test.stageCode === 'groundwork' ? 15 : 60 })),
      }),
      '2027-04-05',
    );
    // their visit is held to version 1: back to its 15 min and its hour, nothing differs for them
    expect(mailsOf('superintendent')[0]?.text).toContain('It changes nothing for the stages of your open visits.');
  });

  it('tells what differs from several older versions once', () => {
    const after = ruleCardContent();
    const older = (cutoff: string) => ruleCardContent({ asking: { ...after.asking, cutoff } });
    const told = changesForVisits(
      [
        { stageCode: 'rough-in', content: older('13:00') },
        { stageCode: 'groundwork', content: older('12:00') },
      ],
      after,
    );
    expect(told).toHaveLength(1);
    expect(told[0]?.before?.en[0]).toContain('1:00 pm');
  });
});
