/**
 * The first parts of every query key, once, so that live changes reach what is shown. A feature's `queryOptions` factory spreads one of
 * these and may add its own parameters behind: `[...queryKeys.lotPart(lotId, 'visits')]`, `[...queryKeys.calendar, { from, to }]`.
 */
export const queryKeys = {
  calendar: ['calendar'],
  waiting: ['waiting'],
  run: ['run'],
  dayBoard: ['day-board'],
  requests: ['requests'],
  offers: ['offers'],
  notices: ['notices'],
  lots: ['lots'],
  search: ['search'],
  tracts: ['tracts'],
  houseModels: ['house-models'],
  consents: ['consents'],
  corrections: ['corrections'],
  departments: ['departments'],
  ruleCards: ['rule-cards'],
  people: ['people'],
  organizations: ['organizations'],
  deliveries: ['deliveries'],
  ledgerCheck: ['ledger-check'],
  visit: (visitId: string) => ['visit', visitId] as const,
  visits: ['visit'],
  lot: (lotId: string) => ['lot', lotId] as const,
  lotPart: (lotId: string, part: LotPart) => ['lot', lotId, part] as const,
} as const;

/** What of a lot is queried on its own. `detail` is the lot itself. */
export type LotPart = 'detail' | 'thread' | 'visits' | 'plans' | 'holds' | 'outcomes' | 'corrections' | 'clearance' | 'ledger';
