import type { Browser, Page } from 'playwright-core';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { desk, launchBrowser, patienceMs, phone, type Opened } from '../support/browser.js';
import { listInvites, type Invite } from '../support/invites.js';
import { choose, press, see, type } from './support/acts.js';
import { openPath } from './support/page-checks.js';
import { openAs } from './support/people.js';
import { inspectorOf } from './support/scene.js';
import { keepShot } from './support/shots.js';
import { startStack, type Stack } from './support/stack.js';
import * as acts from './support/story-acts.js';

/** One lot, three people in three browsers at once: asked for, moved, tested, failed, fixed, tested again, passed. */
describe('the main job', { timeout: 300_000 }, () => {
  let stack: Stack;
  let browser: Browser;
  const opened: Opened[] = [];
  let builder: Page;
  let plumber: Page;
  let inspector: Page;
  let lotPath: string;
  const lotId = (): string => stack.world.lots[0].id;
  const visits = async (): Promise<VisitSummary[]> => {
    const answer = await stack.call('superintendent', 'get', `/api/lots/${lotId()}/visits`);
    return (answer as { items: VisitSummary[] }).items;
  };
  const newest = async (): Promise<VisitSummary> => {
    const [visit] = await visits();
    if (!visit) throw new Error('the lot has no visit');
    return visit;
  };
  const open = async (
    ...parts: Parameters<typeof openAs> extends [unknown, unknown, ...infer Rest] ? Rest : never
  ): Promise<Page> => {
    const one = await openAs(browser, stack, ...parts);
    opened.push(one);
    return one.page;
  };
  /** Invites as ical.js reads them, once as many are there as are due. */
  const invitesTo = async (email: string, count: number): Promise<Invite[]> => {
    const read = (): Invite[] => listInvites(stack.mailbox).filter(({ to }) => to === email);
    await vi.waitUntil(() => read().length >= count, { timeout: patienceMs, interval: 200 });
    return read();
  };
  const emailOf = (person: 'superintendent' | 'plumber'): string => stack.world.people[person].email;

  beforeAll(async () => {
    stack = await startStack();
    lotPath = `/lots/${lotId()}`;
    browser = await launchBrowser();
    builder = await open('superintendent', desk);
    plumber = await open('plumber', phone);
  }, 240_000);
  afterEach(async ({ task }) => {
    if (task.result?.state !== 'fail') return;
    for (const [index, { page }] of opened.entries()) await keepShot(page, `story fault ${index}`);
  });
  afterAll(async () => {
    await browser?.close();
    await stack?.stop();
  });

  it('the superintendent books a window and moves it; the invite follows under the same UID', async () => {
    const words = await acts.requestWindow(builder, '1');
    await keepShot(builder, 'story 01 booked');
    const first = await newest();
    expect(first).toMatchObject({ state: 'booked', stageCode: 'rough-in' });
    expect(words).toMatch(/^Book 1 visit, \w/);
    await openPath(builder, `/calendar?date=${first.window.date}&visit=${first.id}`);
    await acts.openMove(builder);
    await keepShot(builder, 'story 02 move');
    await builder
      .getByRole('radiogroup', { name: 'Windows to move to' })
      .locator('label:not(.off):not(.on)')
      .last()
      .click();
    await builder.getByRole('button', { name: /^Move Lot 1 to /i }).click();
    await see(builder, /^Lot 1 moved to /);
    const moved = await newest();
    expect(moved.window.startAt).not.toBe(first.window.startAt);
    for (const email of [emailOf('superintendent'), emailOf('plumber')]) {
      const [invite, update] = await invitesTo(email, 2);
      expect(invite).toMatchObject({ method: 'REQUEST' });
      expect(update).toMatchObject({ method: 'REQUEST', uid: invite?.uid });
      expect(update?.sequence).toBeGreaterThan(invite?.sequence ?? Infinity);
      expect(Date.parse(update?.startAt ?? '')).toBeGreaterThanOrEqual(Date.parse(moved.window.startAt));
      expect(Date.parse(update?.endAt ?? '')).toBeLessThanOrEqual(Date.parse(moved.window.endAt));
    }
  });

  it('the plumber puts both tests up on the phone; the superintendent sees it without reload', async () => {
    await openPath(builder, lotPath);
    await builder.getByRole('heading', { level: 1 }).waitFor();
    await openPath(plumber, `${lotPath}/test`);
    await acts.startDwvTest(plumber);
    await keepShot(plumber, 'story 03 dwv stands');
    await acts.startWaterTestAndSayUp(plumber);
    await keepShot(plumber, 'story 04 test up');
    await see(builder, /Test up since/);
    await keepShot(builder, 'story 05 builder sees test up');
    expect((await newest()).state).toBe('ready');
  });

  it('the inspector begins before the window and fails the drain with one correction', async () => {
    const visit = await newest();
    inspector = await open(inspectorOf(stack, visit), phone);
    await acts.beginEarly(inspector, visit.window.date, '1');
    await keepShot(inspector, 'story 06 outcome');
    await acts.openCorrection(inspector, 'Drip at the second-floor tee');
    await choose(inspector.getByRole('region', { name: 'DWV', exact: true }), 'DWV', 'fail');
    await acts.answerWater(inspector);
    await acts.lookAtTheWork(inspector);
    await keepShot(inspector, 'story 07 answered');
    await acts.record(inspector, 'fail');
    await see(builder, 'Drip at the second-floor tee');
    await keepShot(builder, 'story 08 builder sees the fail');
    expect(await newest()).toMatchObject({ state: 'closed', outcome: { kind: 'fail' }, openCorrections: 1 });
  });

  it('what one writes the two others read at once', async () => {
    await openPath(inspector, `${lotPath}/thread`);
    await openPath(plumber, `${lotPath}/thread`);
    for (const page of [inspector, plumber]) await page.getByPlaceholder('Write').waitFor();
    await acts.write(builder, 'Who cuts the tee out?');
    for (const page of [builder, inspector, plumber]) await see(page, 'Who cuts the tee out?');
    await acts.write(plumber, 'I do, this afternoon.');
    for (const page of [plumber, builder, inspector]) await see(page, 'I do, this afternoon.');
    await acts.write(inspector, 'Then ask again for tomorrow.');
    for (const page of [builder, plumber]) await see(page, 'Then ask again for tomorrow.');
    await keepShot(plumber, 'story 09 thread');
  });

  it('the plumber marks it fixed; the superintendent asks again; the tests are said up again', async () => {
    await openPath(plumber, '/corrections');
    await press(plumber, 'Correction 1: fixed');
    await type(plumber, 'What was done', 'Cut out and glued a new tee');
    await press(plumber, 'Say it is fixed');
    await see(plumber, 'Correction 1 is fixed and waits on the inspector');
    await keepShot(plumber, 'story 10 fixed');
    await see(builder, /fixed, waits on the inspector/);
    await acts.requestWindow(builder, '1');
    await openPath(plumber, `${lotPath}/test`);
    await plumber
      .getByRole('radiogroup', { name: 'System to test' })
      .or(plumber.getByRole('heading', { level: 1 }))
      .first()
      .waitFor();
    await press(plumber, 'Say test up');
    await see(plumber, /^Lot 1: test up$/);
    expect(await newest()).toMatchObject({ state: 'ready', isRetest: true });
  });

  it('the inspector accepts the correction and passes; the plumbing is clear of it', async () => {
    const visit = await newest();
    const name = inspectorOf(stack, visit);
    await opened.at(-1)?.context.close();
    inspector = await open(name, phone);
    await openPath(builder, lotPath);
    await acts.beginEarly(inspector, visit.window.date, '1');
    await choose(inspector, 'Correction 1', 'accept');
    await choose(inspector.getByRole('region', { name: 'DWV', exact: true }), 'DWV', 'pass');
    await acts.answerWater(inspector);
    await acts.lookAtTheWork(inspector);
    await acts.record(inspector, 'pass');
    await see(builder, /accepted/);
    await keepShot(builder, 'story 11 passed');
    expect((await visits()).map(({ outcome }) => outcome?.kind)).toEqual(['pass', 'fail']);
  });

  it('each visit is a calendar entry of its own, and nobody saw an error', async () => {
    const invites = await invitesTo(emailOf('superintendent'), 3);
    expect(new Set(invites.map(({ uid }) => uid)).size).toBe(2);
    expect(opened.flatMap(({ complaints }) => complaints)).toEqual([]);
  });
});
