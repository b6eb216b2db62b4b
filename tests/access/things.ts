import { randomUUID } from 'node:crypto';
import { OrganizationModel } from '@holdwater/backend/accounts/organization.model.js';
import { PastPartyModel } from '@holdwater/backend/handovers/past-party.model.js';
import { CorrectionModel } from '@holdwater/backend/outcomes/correction.model.js';
import { OutcomeModel } from '@holdwater/backend/outcomes/outcome.model.js';
import { LotConsentModel } from '@holdwater/backend/lots/lot-consent.model.js';
import { DeliveryModel } from '@holdwater/backend/notices/delivery.model.js';
import { OutboxEventModel } from '@holdwater/backend/notices/outbox-event.model.js';
import { LotModel } from '@holdwater/backend/lots/lot.model.js';
import { VisitModel } from '@holdwater/backend/visits/visit.model.js';
import type { World } from '@holdwater/backend/testing/fixtures/world.js';
import { testNow, type TestApp } from '@holdwater/backend/testing/test-app.js';

/** One of everything a path may name, all of the first set of organizations. */
export type Things = Awaited<ReturnType<typeof makeThings>>;

export async function makeThings(server: TestApp, world: World) {
  const [lot, freeLot, closedLot, askedLot, askedOverLot, pastLot] = world.lots;
  // that a plumber may request where the lot allows it is told beside the visits
  await LotModel.update({ mayPlumberRequest: false }, { where: {} });
  const visit = await post(world, 'superintendent', '/api/visits', {
    lots: [{ lotId: lot.id }],
    stageCode: 'groundwork',
    date: '2027-03-04',
    label: 'mid',
  });
  const { hold, reading } = await makeHold(world, lot.id);
  const plan = await post(world, 'plumber', `/api/lots/${lot.id}/plans`, {
    ...{ clientId: randomUUID(), madeAt: testNow, unitNumber: 1, stageCode: 'rough-in', system: 'dwv' },
    ...{ method: 'attic-cut', medium: 'water' },
  });
  const closedVisitId = await makeClosedVisit(world, closedLot.id);
  const correctionId = await makeCorrection(world, closedLot.id, closedVisitId);
  await makeConsent(server, world, askedLot.id);
  await makeHandovers(server, world, askedOverLot.id, pastLot.id);
  const invitation = await post(
    world,
    'builderOwner',
    `/api/organizations/${world.organizations.builder.id}/invitations`,
    {
      email: 'invited@example.test',
      name: 'Invited',
      roles: ['superintendent'],
    },
  );
  const draft = await post(world, 'desk', `/api/departments/${world.organizations.department.id}/rule-cards`, {});
  const closure = await post(world, 'desk', `/api/departments/${world.organizations.department.id}/closures`, {
    date: '2027-12-07',
    from: null,
    to: null,
    why: 'Staff day',
  });
  const shown = await world.as('superintendent').get(`/api/lots/${lot.id}`);
  const houseModel = (name: string) =>
    post(world, 'superintendent', '/api/house-models', {
      ...{ builderId: world.organizations.builder.id, name, geometry: shown.body.units[0].geometry },
    });
  return {
    lotId: lot.id,
    freeLotId: freeLot.id,
    askedLotId: askedLot.id,
    askedOverLotId: askedOverLot.id,
    pastLotId: pastLot.id,
    tractId: world.tract.id,
    builderId: world.organizations.builder.id,
    plumberId: world.organizations.plumber.id,
    departmentId: world.organizations.department.id,
    superintendentId: world.people.superintendent.id,
    ruleCardId: world.ruleCard.id,
    draftId: draft.id as string,
    content: draft.content as object,
    closureId: closure.id as string,
    invitationId: invitation.id as string,
    visitId: visit.visits[0].id as string,
    closedVisitId,
    correctionId,
    holdId: hold,
    planId: plan.id as string,
    readingId: reading,
    geometry: shown.body.units[0].geometry as object,
    houseModelId: (await houseModel('Plan 2210')).id as string,
    unusedHouseModelId: (await houseModel('Plan 0')).id as string,
    deliveryId: await makeGivenUpDelivery(),
  };
}

async function post(world: World, person: Parameters<World['as']>[0], path: string, body: object) {
  const answer = await world.as(person).post(path, body);
  if (answer.status >= 300) throw new Error(`${person} POST ${path}: ${answer.status} ${JSON.stringify(answer.body)}`);
  return answer.body;
}

async function makeHold(world: World, lotId: string) {
  const write = () => ({ clientId: randomUUID(), madeAt: testNow });
  const started = await post(world, 'plumber', `/api/lots/${lotId}/holds`, {
    ...write(),
    unitNumber: 1,
    stageCode: 'groundwork',
    system: 'dwv',
    method: 'standpipe',
    medium: 'water',
    tape: { incrementIn: 0.25 },
    fillLevelFt: 10,
    firstReading: { ...write(), levelIn: 0 },
  });
  return { hold: started.id as string, reading: started.readings[0].id as string };
}

/** Written directly: how a visit comes to its end is told elsewhere. */
async function makeClosedVisit(world: World, lotId: string): Promise<string> {
  const id = randomUUID();
  const at = new Date('2027-02-25T17:00:00Z');
  await VisitModel.create({
    id,
    lotId,
    departmentId: world.organizations.department.id,
    ruleCardId: world.ruleCard.id,
    stageCode: 'groundwork',
    unitNumbers: [1],
    state: 'closed',
    windowDate: '2027-02-25',
    windowLabel: 'mid',
    window: [new Date('2027-02-25T16:00:00Z'), new Date('2027-02-25T18:00:00Z')],
    place: 1,
    inspectorId: world.people.inspector.id,
    planned: [at, new Date('2027-02-25T17:25:00Z')],
    requestedBy: world.people.superintendent.id,
    requestingSide: 'builder',
    requestedAt: at,
    calendarUid: randomUUID(),
    createdAt: at,
    endedAt: at,
  });
  await OutcomeModel.create({
    id: randomUUID(),
    clientId: randomUUID(),
    visitId: id,
    kind: 'fail',
    madeAt: at,
    receivedAt: at,
    byPerson: world.people.inspector.id,
  });
  return id;
}

async function makeCorrection(world: World, lotId: string, visitId: string): Promise<string> {
  const id = randomUUID();
  await CorrectionModel.create({
    id,
    clientId: randomUUID(),
    lotId,
    visitId,
    unitNumber: 1,
    stageCode: 'groundwork',
    number: 1,
    subject: 'work',
    text: 'Hanger missing',
    place: 'whole-system',
    severity: 'fix-before-cover',
    state: 'open',
    openedAt: new Date('2027-02-25T17:00:00Z'),
    openedBy: world.people.inspector.id,
  });
  return id;
}

async function makeConsent(server: TestApp, world: World, lotId: string): Promise<void> {
  await LotModel.update({ plumberId: null }, { where: { id: lotId } });
  await LotConsentModel.create({
    id: randomUUID(),
    lotId,
    kind: 'plumber',
    organizationId: world.organizations.plumber.id,
    askedBy: world.people.superintendent.id,
    askedAt: server.clock.now(),
  });
}

/** One lot that the first set's plumber is asked to take over from a third, and one it was replaced on by that third. */
async function makeHandovers(server: TestApp, world: World, askedOverLotId: string, pastLotId: string): Promise<void> {
  const at = server.clock.now();
  const third = await OrganizationModel.create({
    ...{ id: randomUUID(), name: 'Corrin Pipe', kind: 'plumber', phone: null, createdAt: at },
  });
  const plumberId = world.organizations.plumber.id;
  await LotModel.update({ plumberId: third.id }, { where: { id: [askedOverLotId, pastLotId] } });
  await LotConsentModel.create({
    ...{ id: randomUUID(), lotId: askedOverLotId, kind: 'plumber', organizationId: plumberId, replacesId: third.id },
    ...{ askedBy: world.people.superintendent.id, askedAt: at },
  });
  await PastPartyModel.create({
    ...{ id: randomUUID(), lotId: pastLotId, kind: 'plumber', organizationId: plumberId, replacedById: third.id },
    ...{ until: at, untilSequence: 1, lotNumber: '6', tractName: null, address: '6 Tern Court' },
  });
}

async function makeGivenUpDelivery(): Promise<string> {
  const at = new Date('2027-02-25T17:00:00Z');
  const event = await OutboxEventModel.create({
    id: randomUUID(),
    kind: 'comment',
    payload: {},
    at,
    processedAt: at,
    nextAttemptAt: at,
  });
  const delivery = await DeliveryModel.create({
    id: randomUUID(),
    eventId: event.id,
    channel: 'email',
    kind: 'comment',
    address: 'gone@example.test',
    messageId: `<${randomUUID()}@example.test>`,
    payload: {},
    state: 'given-up',
    nextAttemptAt: at,
    createdAt: at,
  });
  return delivery.id;
}
