import { randomUUID } from 'node:crypto';
import type { WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import type { Things } from './things.js';

/** The people of the lot's own three organizations. */
const own = [
  'superintendent',
  'builderOwner',
  'plumber',
  'helper',
  'plumberOwner',
  'desk',
  'inspector',
  'secondInspector',
  'departmentOwner',
] as const satisfies readonly WorldPerson[];
const inspectors = ['inspector', 'secondInspector'] as const satisfies readonly WorldPerson[];
const talkers = [
  'superintendent',
  'plumber',
  'helper',
  'desk',
  ...inspectors,
] as const satisfies readonly WorldPerson[];

export interface MatrixRow {
  /** Who is let through; the rest get 404 or 403. `anyone` needs no sign-in, `signed-in` is everybody with one. */
  readonly may: readonly WorldPerson[] | 'anyone' | 'signed-in';
  /** Everybody may know that it is there (a department is public), so a refusal may be 403. */
  readonly isPublicThing?: true;
  readonly path?: (things: Things) => string;
  readonly body?: (things: Things) => object;
}

const write = () => ({ clientId: randomUUID(), madeAt: '2027-03-02T16:30:00Z' });
const day = { date: '2027-03-09', label: 'mid' };
const correctionMove = () => ({ expectedVersion: 0, ...write() });

/**
 * Every route and who may, from the pinned table of rights. A route that is not here fails the test, and so does a row without a route.
 */
export const matrix: Readonly<Record<string, MatrixRow>> = {
  'GET /api/health': { may: 'anyone' },
  'GET /api/ready': { may: 'anyone' },
  'GET /api/openapi.json': { may: 'anyone' },
  'GET /api/docs': { may: 'anyone' },
  'GET /api/public/rule-cards': { may: 'anyone' },
  'GET /api/public/rule-cards/:ruleCardId': { may: 'anyone', path: (t) => `/api/public/rule-cards/${t.ruleCardId}` },

  // these answer 401 or 410 by their own rules, tested beside them; here only that no sign-in is asked for first
  'POST /api/auth/sign-in': { may: 'anyone', body: () => ({ email: 'nobody@example.test', password: 'x' }) },
  'POST /api/auth/refresh': { may: 'anyone' },
  'POST /api/auth/sign-in-link': { may: 'anyone', body: () => ({ email: 'nobody@example.test' }) },
  'POST /api/auth/sign-in-link/use': { may: 'anyone', body: () => ({ token: 'x'.repeat(43) }) },
  'POST /api/auth/password-reset': { may: 'anyone', body: () => ({ email: 'nobody@example.test' }) },
  'POST /api/auth/password-reset/use': {
    may: 'anyone',
    body: () => ({ token: 'x'.repeat(43), password: 'a long new one, really' }),
  },
  'POST /api/auth/invitation': { may: 'anyone', body: () => ({ token: 'x'.repeat(43) }) },
  'POST /api/auth/invitation/accept': { may: 'anyone', body: () => ({ token: 'x'.repeat(43) }) },

  'GET /api/me': { may: 'signed-in' },
  'PATCH /api/me': { may: 'signed-in', body: () => ({ units: 'us' }) },
  'POST /api/me/password': {
    may: 'signed-in',
    body: () => ({ currentPassword: 'not it', password: 'a long new one, really' }),
  },
  'GET /api/organizations': { may: 'signed-in' },
  'GET /api/departments': { may: 'signed-in' },
  'GET /api/departments/:departmentId': { may: 'signed-in', path: (t) => `/api/departments/${t.departmentId}` },
  'GET /api/rule-cards/:ruleCardId': { may: 'signed-in', path: (t) => `/api/rule-cards/${t.ruleCardId}` },
  'GET /api/lots': { may: 'signed-in' },
  'GET /api/search': { may: 'signed-in', path: () => '/api/search?q=1' },
  'GET /api/tracts': { may: 'signed-in' },
  'GET /api/consents': { may: 'signed-in' },
  'GET /api/calendar': { may: 'signed-in', path: () => '/api/calendar?from=2027-03-01&to=2027-03-05' },
  'GET /api/waiting': { may: 'signed-in' },
  'GET /api/corrections': { may: 'signed-in' },
  'GET /api/notices': { may: 'signed-in' },
  'POST /api/notices/read': { may: 'signed-in' },
  'POST /api/calc/dwv-plan': { may: 'signed-in' },
  'POST /api/calc/water-plan': { may: 'signed-in' },
  'POST /api/calc/hold': { may: 'signed-in' },
  'POST /api/calc/dial': { may: 'signed-in' },
  'POST /api/calc/notice': { may: 'signed-in' },

  'POST /api/organizations': {
    may: ['operator'],
    body: () => ({
      name: randomUUID(),
      kind: 'builder',
      ownerEmail: `${randomUUID()}@example.test`,
      ownerName: 'New Owner',
    }),
  },
  'GET /api/operations/deliveries': { may: ['operator'] },
  'POST /api/operations/deliveries/:deliveryId/retry': {
    may: ['operator'],
    path: (t) => `/api/operations/deliveries/${t.deliveryId}/retry`,
  },
  'GET /api/operations/ledger': { may: ['operator'] },

  'GET /api/organizations/:organizationId/people': {
    may: ['superintendent', 'builderOwner', 'operator'],
    path: (t) => `/api/organizations/${t.builderId}/people`,
  },
  'POST /api/organizations/:organizationId/invitations': {
    may: ['builderOwner'],
    path: (t) => `/api/organizations/${t.builderId}/invitations`,
    body: () => ({ email: `${randomUUID()}@example.test`, name: 'Newcomer', roles: ['superintendent'] }),
  },
  'DELETE /api/organizations/:organizationId/invitations/:invitationId': {
    may: ['builderOwner'],
    path: (t) => `/api/organizations/${t.builderId}/invitations/${t.invitationId}`,
  },
  'PATCH /api/organizations/:organizationId/people/:personId': {
    may: ['builderOwner'],
    path: (t) => `/api/organizations/${t.builderId}/people/${t.superintendentId}`,
    body: () => ({ roles: ['superintendent'] }),
  },

  'POST /api/departments/:departmentId/rule-cards': {
    may: ['desk'],
    isPublicThing: true,
    path: (t) => `/api/departments/${t.departmentId}/rule-cards`,
  },
  'PUT /api/rule-cards/:ruleCardId': {
    may: ['desk'],
    path: (t) => `/api/rule-cards/${t.draftId}`,
    body: (t) => ({ content: t.content }),
  },
  'POST /api/rule-cards/:ruleCardId/publish': {
    may: ['desk'],
    path: (t) => `/api/rule-cards/${t.draftId}/publish`,
    body: () => ({ effectiveFrom: '2027-12-01' }),
  },
  // behind the publishing: by then it is refused as no draft any more, which is not a refusal of who may
  'DELETE /api/rule-cards/:ruleCardId': { may: ['desk'], path: (t) => `/api/rule-cards/${t.draftId}` },
  'GET /api/rule-cards/:ruleCardId/touches': {
    may: ['desk', ...inspectors, 'departmentOwner'],
    path: (t) => `/api/rule-cards/${t.draftId}/touches`,
  },
  'POST /api/departments/:departmentId/closures': {
    may: ['desk'],
    isPublicThing: true,
    path: (t) => `/api/departments/${t.departmentId}/closures`,
    body: () => ({ date: '2027-11-02', from: null, to: null, why: 'Staff day' }),
  },
  'DELETE /api/departments/:departmentId/closures/:closureId': {
    may: ['desk'],
    isPublicThing: true,
    path: (t) => `/api/departments/${t.departmentId}/closures/${t.closureId}`,
  },
  'GET /api/departments/:departmentId/requests': {
    may: ['desk'],
    path: (t) => `/api/departments/${t.departmentId}/requests`,
  },
  'GET /api/departments/:departmentId/day': {
    may: ['desk'],
    path: (t) => `/api/departments/${t.departmentId}/day?date=2027-03-04`,
  },
  'GET /api/runs': {
    may: [...inspectors, 'desk'],
    path: (t) => `/api/runs?date=2027-03-04&departmentId=${t.departmentId}`,
  },

  'POST /api/tracts': { may: ['superintendent'], body: (t) => ({ builderId: t.builderId, name: randomUUID() }) },
  'PATCH /api/tracts/:tractId': {
    may: ['superintendent'],
    path: (t) => `/api/tracts/${t.tractId}`,
    body: () => ({ plat: null }),
  },
  'GET /api/house-models': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/house-models?builderId=${t.builderId}`,
  },
  'POST /api/house-models': {
    may: ['superintendent', 'builderOwner'],
    body: (t) => ({ builderId: t.builderId, name: randomUUID(), geometry: t.geometry }),
  },
  'GET /api/house-models/:houseModelId': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/house-models/${t.houseModelId}`,
  },
  'PATCH /api/house-models/:houseModelId': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/house-models/${t.houseModelId}`,
    body: () => ({ name: randomUUID() }),
  },
  'POST /api/house-models/:houseModelId/versions': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/house-models/${t.houseModelId}/versions`,
    body: (t) => ({ expectedVersion: 99, geometry: t.geometry }),
  },
  'GET /api/house-models/:houseModelId/units': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/house-models/${t.houseModelId}/units?tractId=${t.tractId}`,
  },
  'POST /api/house-models/:houseModelId/apply': {
    may: ['superintendent'],
    path: (t) => `/api/house-models/${t.houseModelId}/apply`,
    body: (t) => ({ expectedVersion: 99, units: [{ lotId: t.lotId, unitNumber: 1 }] }),
  },
  'DELETE /api/house-models/:houseModelId': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/house-models/${t.unusedHouseModelId}`,
  },
  'POST /api/lots': {
    may: ['superintendent'],
    body: (t) => ({
      builderId: t.builderId,
      tractId: t.tractId,
      number: randomUUID().slice(0, 8),
      address: '1 Elsewhere Street',
    }),
  },
  'POST /api/lots/import': {
    may: ['superintendent'],
    body: (t) => ({ builderId: t.builderId, csv: 'number,address\n900,9 Elsewhere Street', isTrial: true }),
  },
  'POST /api/consents': {
    may: ['plumber', 'plumberOwner'],
    body: (t) => ({ organizationId: t.plumberId, lotIds: [t.askedLotId], isJoining: true }),
  },

  'GET /api/lots/:lotId': { may: own, path: (t) => `/api/lots/${t.lotId}` },
  'GET /api/lots/:lotId/visits': { may: own, path: (t) => `/api/lots/${t.lotId}/visits` },
  'GET /api/lots/:lotId/holds': { may: own, path: (t) => `/api/lots/${t.lotId}/holds` },
  'GET /api/lots/:lotId/comments': { may: own, path: (t) => `/api/lots/${t.lotId}/comments` },
  'GET /api/lots/:lotId/ledger': { may: own, path: (t) => `/api/lots/${t.lotId}/ledger` },
  'GET /api/lots/:lotId/ledger/check': { may: own, path: (t) => `/api/lots/${t.lotId}/ledger/check` },
  'GET /api/visits/:visitId': { may: own, path: (t) => `/api/visits/${t.visitId}` },
  'GET /api/visits/:visitId/outcome': { may: own, path: (t) => `/api/visits/${t.closedVisitId}/outcome` },
  'POST /api/lots/:lotId/comments': {
    may: talkers,
    path: (t) => `/api/lots/${t.lotId}/comments`,
    body: () => ({ ...write(), text: 'hello' }),
  },

  'PATCH /api/lots/:lotId': {
    may: ['superintendent'],
    path: (t) => `/api/lots/${t.lotId}`,
    body: () => ({ address: '12 Elsewhere Street' }),
  },
  'PUT /api/lots/:lotId/units/:unitNumber/geometry': {
    may: ['superintendent', 'plumber'],
    path: (t) => `/api/lots/${t.lotId}/units/1/geometry`,
    body: (t) => ({ geometry: t.geometry }),
  },
  'POST /api/lots/:lotId/parties': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/lots/${t.lotId}/parties`,
    body: (t) => ({ kind: 'plumber', organizationId: t.plumberId }),
  },

  'POST /api/lots/:lotId/handovers': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/lots/${t.lotId}/handovers`,
    body: (t) => ({ kind: 'plumber', organizationId: t.plumberId }),
  },
  'POST /api/lots/:lotId/handovers/answer': {
    may: ['plumber', 'plumberOwner'],
    path: (t) => `/api/lots/${t.askedOverLotId}/handovers/answer`,
    body: (t) => ({ organizationId: t.plumberId, isJoining: false }),
  },
  'DELETE /api/lots/:lotId/handovers/:kind': {
    may: ['superintendent', 'builderOwner'],
    path: (t) => `/api/lots/${t.lotId}/handovers/plumber`,
  },
  'GET /api/past-lots': { may: 'signed-in' },
  'GET /api/past-lots/:lotId': {
    may: ['plumber', 'helper', 'plumberOwner'],
    path: (t) => `/api/past-lots/${t.pastLotId}`,
  },
  'GET /api/past-lots/:lotId/ledger': {
    may: ['plumber', 'helper', 'plumberOwner'],
    path: (t) => `/api/past-lots/${t.pastLotId}/ledger`,
  },

  'POST /api/visits/offers': {
    may: ['superintendent', 'desk'],
    body: (t) => ({ lots: [{ lotId: t.freeLotId }], stageCode: 'groundwork' }),
  },
  'POST /api/visits': {
    may: ['superintendent', 'desk'],
    body: (t) => ({ lots: [{ lotId: t.freeLotId }], stageCode: 'groundwork', ...day }),
  },
  'POST /api/visits/:visitId/place': {
    may: ['desk'],
    path: (t) => `/api/visits/${t.visitId}/place`,
    body: () => ({ expectedVersion: 0, ...day }),
  },
  'POST /api/visits/:visitId/decline': {
    may: ['desk'],
    path: (t) => `/api/visits/${t.visitId}/decline`,
    body: () => ({ expectedVersion: 0, reason: 'no' }),
  },
  'POST /api/visits/:visitId/not-reached': {
    may: ['desk'],
    path: (t) => `/api/visits/${t.visitId}/not-reached`,
    body: () => ({ expectedVersion: 99 }),
  },
  'POST /api/visits/:visitId/free': {
    may: ['desk'],
    path: (t) => `/api/visits/${t.visitId}/free`,
    body: () => ({ expectedVersion: 99, reason: 'closed' }),
  },
  'POST /api/visits/:visitId/move': {
    may: ['superintendent', 'desk'],
    path: (t) => `/api/visits/${t.visitId}/move`,
    body: () => ({ expectedVersion: 99, ...day }),
  },
  'POST /api/visits/:visitId/withdraw': {
    may: ['superintendent', 'desk'],
    path: (t) => `/api/visits/${t.visitId}/withdraw`,
    body: () => ({ expectedVersion: 99, reason: 'weather' }),
  },
  'POST /api/visits/:visitId/test-up': {
    may: ['plumber'],
    path: (t) => `/api/visits/${t.visitId}/test-up`,
    body: correctionMove,
  },
  'POST /api/visits/:visitId/no-longer-up': {
    may: ['plumber', ...inspectors],
    path: (t) => `/api/visits/${t.visitId}/no-longer-up`,
    body: correctionMove,
  },
  'POST /api/visits/:visitId/begin': {
    may: inspectors,
    path: (t) => `/api/visits/${t.visitId}/begin`,
    body: () => ({ expectedVersion: 99, ...write(), isTakingOver: true }),
  },
  'POST /api/visits/:visitId/undo-begin': {
    may: inspectors,
    path: (t) => `/api/visits/${t.visitId}/undo-begin`,
    body: () => ({ expectedVersion: 99 }),
  },
  'POST /api/visits/:visitId/outcome': {
    may: inspectors,
    path: (t) => `/api/visits/${t.visitId}/outcome`,
    body: () => ({ expectedVersion: 99, ...write(), result: { kind: 'no-access', reason: 'locked' } }),
  },

  'GET /api/lots/:lotId/plans': { may: own, path: (t) => `/api/lots/${t.lotId}/plans` },
  'GET /api/lots/:lotId/plans/history': {
    may: own,
    path: (t) => `/api/lots/${t.lotId}/plans/history?unitNumber=1&stageCode=rough-in&system=dwv`,
  },
  'GET /api/plans/:planId': { may: own, path: (t) => `/api/plans/${t.planId}` },
  'POST /api/lots/:lotId/plan-offers': {
    may: own,
    path: (t) => `/api/lots/${t.lotId}/plan-offers`,
    body: () => ({ unitNumber: 1, stageCode: 'rough-in', system: 'dwv' }),
  },
  'POST /api/lots/:lotId/plans': {
    may: ['plumber'],
    path: (t) => `/api/lots/${t.lotId}/plans`,
    body: () => ({
      ...write(),
      ...{ unitNumber: 1, stageCode: 'rough-in', system: 'water', method: 'gauge', medium: 'water' },
    }),
  },

  'POST /api/lots/:lotId/holds': {
    may: ['plumber'],
    path: (t) => `/api/lots/${t.lotId}/holds`,
    body: () => ({
      ...write(),
      unitNumber: 1,
      stageCode: 'groundwork',
      system: 'dwv',
      method: 'standpipe',
      medium: 'water',
      tape: { incrementIn: 0.25 },
      firstReading: { ...write(), levelIn: 0 },
    }),
  },
  'POST /api/holds/:holdId/readings': {
    may: ['superintendent', 'plumber', 'helper', ...inspectors],
    path: (t) => `/api/holds/${t.holdId}/readings`,
    body: () => ({ ...write(), levelIn: 1 }),
  },
  'POST /api/readings/:readingId/strike': {
    may: ['plumber', 'helper'],
    path: (t) => `/api/readings/${t.readingId}/strike`,
    body: () => ({ why: 'typed wrong' }),
  },
  'POST /api/holds/:holdId/end': {
    may: ['plumber'],
    path: (t) => `/api/holds/${t.holdId}/end`,
    body: () => ({ ...write(), reason: 'taken-down' }),
  },

  'POST /api/corrections/:correctionId/fixed': {
    may: ['plumber'],
    path: (t) => `/api/corrections/${t.correctionId}/fixed`,
    body: () => ({ ...correctionMove(), note: 'done' }),
  },
  'POST /api/corrections/:correctionId/accept': {
    may: inspectors,
    path: (t) => `/api/corrections/${t.correctionId}/accept`,
    body: correctionMove,
  },
  'POST /api/corrections/:correctionId/reopen': {
    may: inspectors,
    path: (t) => `/api/corrections/${t.correctionId}/reopen`,
    body: () => ({ ...correctionMove(), why: 'still drips' }),
  },

  // ends the session of its cookie; without one there is nothing to end
  'POST /api/auth/sign-out': { may: 'anyone' },
  // last: it ends the sessions the others use
  'POST /api/auth/sign-out-everywhere': { may: 'signed-in' },
};
