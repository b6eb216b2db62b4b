import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { HoldScenario } from '../holds/holds.scenario.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { correctionBody, failedDrain, outcomeBody, seenResult } from './outcomes.scenario.js';

describe('corrections over the API', () => {
  let server: TestApp;
  let world: World;
  let scenario: HoldScenario;
  /** Three on lot 1 — drain, work, a note — and one on lot 2, opened later. */
  let ofLot1: Correction[];
  let ofLot2: Correction[];
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    scenario = new HoldScenario(server, world);
    const result = failedDrain();
    result.corrections.push(
      correctionBody({ subject: 'work', text: 'Bare stud' }),
      correctionBody({ subject: 'water', severity: 'note', text: 'Label it' }),
    );
    ofLot1 = await failed(0, result);
    server.clock.advance(1);
    ofLot2 = await failed(1, failedDrain());
  });
  afterAll(() => server?.close());

  async function failed(index: 0 | 1, result: ReturnType<typeof seenResult>): Promise<Correction[]> {
    const visit = await scenario.visit(world.lots[index], { state: 'underway' });
    const answer = await world
      .as('inspector')
      .post(`/api/visits/${visit.id}/outcome`, outcomeBody(scenario, 0, result))
      .expect(200);
    return answer.body.corrections as Correction[];
  }
  const moveAs = (
    person: WorldPerson,
    correction: Correction | undefined,
    act: 'fixed' | 'accept' | 'reopen',
    parts: object = {},
  ) =>
    world.as(person).post(`/api/corrections/${correction?.id}/${act}`, {
      ...scenario.stamp(),
      expectedVersion: correction?.version,
      ...parts,
    });
  const listAs = async (
    person: WorldPerson,
    query = '',
  ): Promise<{ items: Correction[]; nextCursor: string | null }> => {
    const answer = await world.as(person).get(`/api/corrections${query}`).expect(200);
    return answer.body as { items: Correction[]; nextCursor: string | null };
  };
  const named = (items: Correction[]) => items.map((each) => `${each.lotNumber}-${each.number}`);

  describe('listed', () => {
    it('newest first, to whoever may read the lot, with what each may do', async () => {
      for (const person of ['superintendent', 'plumber', 'helper', 'inspector', 'desk', 'builderOwner'] as const) {
        const { items } = await listAs(person);
        expect(named(items)).toEqual(['2-1', '1-3', '1-2', '1-1']);
        expect(items.every((each) => each.abilities.canFix === (person === 'plumber'))).toBe(true);
        expect(items.every((each) => !each.abilities.canDecide)).toBe(true);
      }
      const [first] = (await listAs('desk')).items;
      expect(first).toMatchObject({
        tractName: 'Quillback Rise',
        openedBy: 'Noor Haverty',
        fixedBy: null,
        state: 'open',
        version: 0,
      });
    });

    it('to nobody else', async () => {
      for (const person of ['otherSuperintendent', 'otherPlumber', 'otherInspector', 'operator'] as const) {
        expect((await listAs(person)).items).toEqual([]);
        await world.as(person).get(`/api/corrections?lotId=${world.lots[0].id}`).expect(404);
        await world.as(person).get(`/api/corrections?organizationId=${world.organizations.builder.id}`).expect(404);
      }
    });

    it('by lot, by state and by organization', async () => {
      expect(named((await listAs('plumber', `?lotId=${world.lots[0].id}`)).items)).toEqual(['1-3', '1-2', '1-1']);
      expect((await listAs('plumber', '?state=accepted')).items).toEqual([]);
      expect(
        (await listAs('plumber', `?organizationId=${world.organizations.plumber.id}&state=open`)).items,
      ).toHaveLength(4);
    });

    it('in pages that neither repeat nor skip, and no cursor but ours', async () => {
      const seen: string[] = [];
      let cursor: string | null = null;
      do {
        const page: { items: Correction[]; nextCursor: string | null } = await listAs(
          'desk',
          `?limit=2${cursor === null ? '' : `&cursor=${cursor}`}`,
        );
        seen.push(...named(page.items));
        cursor = page.nextCursor;
      } while (cursor !== null);
      expect(seen).toEqual(['2-1', '1-3', '1-2', '1-1']);
      for (const keys of [
        'x',
        JSON.stringify(['then', 1, 'me']),
        JSON.stringify(['2027-03-02T16:30:00Z', 1.5, randomUUID()]),
      ]) {
        const forged = Buffer.from(keys).toString('base64url');
        const refused = await world.as('desk').get(`/api/corrections?cursor=${forged}`).expect(400);
        expect(refused.body).toMatchObject({ code: 'bad-input', fields: { cursor: 'not-a-cursor' } });
      }
    });
  });

  describe('fixed', () => {
    it('by the plumber of the lot alone', async () => {
      for (const person of ['superintendent', 'helper', 'plumberOwner', 'inspector', 'desk'] as const) {
        expect((await moveAs(person, ofLot1[0], 'fixed', { note: 'done' }).expect(403)).body.code).toBe('not-allowed');
      }
      for (const person of ['otherPlumber', 'otherInspector', 'operator'] as const) {
        expect((await moveAs(person, ofLot1[0], 'fixed', { note: 'done' }).expect(404)).body.code).toBe('not-found');
      }
      await world
        .as('plumber')
        .post(`/api/corrections/${randomUUID()}/fixed`, { ...scenario.stamp(), expectedVersion: 0, note: 'done' })
        .expect(404);
    });

    it('once, with a note, a repeat being the same act; another meets what it is now', async () => {
      const body = { ...scenario.stamp(5), note: 'new tee glued' };
      const fixed = await moveAs('plumber', ofLot1[0], 'fixed', body).expect(200);
      expect(fixed.body).toMatchObject({
        state: 'fixed',
        version: 1,
        fixedBy: 'Ruben Achterberg',
        fixNote: 'new tee glued',
        fixedAt: body.madeAt,
      });
      expect((await moveAs('plumber', ofLot1[0], 'fixed', body).expect(200)).body).toEqual(fixed.body);
      const other = await moveAs('plumber', ofLot1[0], 'fixed', { note: 'again' }).expect(409);
      expect(other.body).toMatchObject({ code: 'stale-state', params: { is: 'fixed', version: 1 } });
      await moveAs('plumber', ofLot1[1], 'fixed', { note: '' }).expect(400);
    });

    it('notes too', async () => {
      expect((await moveAs('plumber', ofLot1[2], 'fixed', { note: 'labelled' }).expect(200)).body.state).toBe('fixed');
    });
  });

  describe('accepted or reopened', () => {
    const now = async (index: number): Promise<Correction> => {
      const { items } = await listAs('inspector', `?lotId=${world.lots[0].id}`);
      const found = items.find((each) => each.number === index);
      if (!found) throw new Error('there is no such correction');
      return found;
    };

    it('by an impartial inspector of the department alone', async () => {
      const correction = await now(1);
      expect(correction.abilities).toEqual({ canFix: false, canDecide: true });
      for (const person of ['superintendent', 'plumber', 'helper', 'desk', 'departmentOwner'] as const) {
        expect((await moveAs(person, correction, 'accept').expect(403)).body.code).toBe('not-allowed');
        expect((await moveAs(person, correction, 'reopen', { why: 'no' }).expect(403)).body.code).toBe('not-allowed');
      }
      await moveAs('otherInspector', correction, 'accept').expect(404);
    });

    it('only once fixed', async () => {
      const open = await now(2);
      expect((await moveAs('inspector', open, 'accept').expect(409)).body).toMatchObject({
        code: 'correction-unfixed',
        params: { number: 2, is: 'open' },
      });
      expect((await moveAs('inspector', open, 'reopen', { why: 'no' }).expect(409)).body.code).toBe(
        'correction-unfixed',
      );
    });

    it('reopened with the reason, fixed again, and accepted by another inspector', async () => {
      const reopened = await moveAs('inspector', await now(1), 'reopen', { why: 'still drips' }).expect(200);
      expect(reopened.body).toMatchObject({
        state: 'open',
        version: 2,
        reopenedWhy: 'still drips',
        fixNote: 'new tee glued',
      });
      const again = await moveAs('plumber', await now(1), 'fixed', { note: 'cut out' }).expect(200);
      expect(again.body).toMatchObject({ state: 'fixed', version: 3, fixNote: 'cut out', reopenedWhy: 'still drips' });
      const fixed = await now(1);
      const accepted = await moveAs('secondInspector', fixed, 'accept').expect(200);
      expect(accepted.body).toMatchObject({
        state: 'accepted',
        version: 4,
        acceptedBy: 'Gil Strand',
        abilities: { canFix: false, canDecide: false },
      });
      expect((await moveAs('secondInspector', fixed, 'accept').expect(200)).body).toEqual(accepted.body);
      expect((await moveAs('inspector', fixed, 'reopen', { why: 'no' }).expect(409)).body).toMatchObject({
        code: 'stale-state',
        params: { is: 'accepted', version: 4 },
      });
      expect((await moveAs('plumber', await now(1), 'fixed', { note: 'x' }).expect(409)).body.params).toEqual({
        is: 'accepted',
        version: 4,
      });
    });

    it('told and recorded once each', async () => {
      const id = ofLot1[0]?.id;
      const sql = `SELECT kind FROM outbox_events WHERE payload ->> 'correctionId' = :id ORDER BY position`;
      const events = await server.db.query<{ kind: string }>(sql, { replacements: { id }, type: QueryTypes.SELECT });
      const expected = [
        'correction-opened',
        'correction-fixed',
        'correction-reopened',
        'correction-fixed',
        'correction-accepted',
      ];
      expect(events.map((row) => row.kind)).toEqual(expected);
      const ledgerSql = `SELECT kind FROM ledger_entries WHERE payload ->> 'correctionId' = :id ORDER BY sequence`;
      const entries = await server.db.query<{ kind: string }>(ledgerSql, {
        replacements: { id },
        type: QueryTypes.SELECT,
      });
      expect(entries.map((row) => row.kind)).toEqual(expected);
    });

    it('of two at the same moment, one is made', async () => {
      await moveAs('plumber', ofLot2[0], 'fixed', { note: 'done' }).expect(200);
      const [fixed] = (await listAs('inspector', `?lotId=${world.lots[1].id}`)).items;
      const answers = await Promise.all([
        moveAs('inspector', fixed, 'accept'),
        moveAs('secondInspector', fixed, 'reopen', { why: 'drips' }),
      ]);
      expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
      expect(answers.find((answer) => answer.status === 409)?.body.code).toBe('stale-state');
    });
  });
});
