import { ruleCardContent, type RuleCardContent } from '../rule-card.content.js';

const gaugeIncrements = [{ upToPsi: 10, incrementPsi: 0.1 }, { percent: 2 }];
const photoWanted = { reading: false, fix: true, takeDown: true };
const airRules = { highestPsi: 60, needsMakersConsent: true, needsReliefValve: true };

const dwv = {
  ...{ stageCode: 'rough-in', system: 'dwv', acceptedMethods: ['attic-cut', 'air'], measuredAt: 'gauge' },
  ...{ headRule: { kind: 'above-highest-fitting', feet: 10 }, standMinutes: 15, settleMinutes: 20 },
  ...{ pressures: [{ medium: 'air', minimumPsi: 5, preferredPsi: 6 }], airOnPlastic: false, airRules },
  ...{ gaugeIncrements, mayStayIsolated: [{ en: 'Tub', es: 'Tina' }], levelSeenFrom: ['overflow'], photoWanted },
};

/** An invented rule card in which every field of the contract is filled, for specs that go through all of them. */
export const wholeRuleCard: RuleCardContent = ruleCardContent.parse({
  stages: [
    {
      ...{ code: 'groundwork', name: { en: 'Groundwork', es: 'Bajo losa' }, inspectionCode: '110', order: 1 },
      ...{ systems: [], covers: 'slab', minutesPerVisit: 20, work: [] },
    },
    {
      ...{ code: 'rough-in', name: { en: 'Rough-in', es: 'Gruesa' }, inspectionCode: '210', order: 2 },
      ...{ systems: ['dwv', 'water'], covers: 'wall', minutesPerVisit: 25 },
      work: [{ code: 'slope', label: { en: 'Slope', es: 'Pendiente' } }],
    },
  ],
  tests: [
    dwv,
    {
      ...{ ...dwv, system: 'water', acceptedMethods: ['gauge'], headRule: null, levelSeenFrom: [] },
      pressures: [{ medium: 'water', minimumPsi: 100, preferredPsi: 120 }],
    },
  ],
  asking: {
    windows: [
      { label: 'early', start: '07:30', end: '09:00', days: [], room: 4 },
      { label: 'midday', start: '11:00', end: '13:00', days: [1, 2, 3, 4], room: 1 },
    ],
    workingDays: [1, 2, 3, 4, 5],
    holidays: { federal: true, adds: ['2027-12-27'], drops: ['2027-10-11'] },
    ...{ cutoff: '15:00', workingDaysAhead: 1, horizonWorkingDays: 10, lotsPerRequest: 3 },
    ...{ whoMayRequest: ['superintendent'], booking: 'self', isPermitNeeded: true, reinspectionWindows: ['midday'] },
  },
  readiness: {
    ...{ upBy: { kind: 'clock-time', time: '07:00' }, reminderHoursBefore: [2, 14], whenNotUp: 'goes-to-standby' },
    ...{ isExtensionAllowed: true, standbyOfferMinutes: 30 },
  },
  fees: [{ event: 're-inspection', firstFree: 1, cents: 6500, payer: 'plumber', isPaidBeforeNext: false }],
  corrections: {
    frequent: [{ code: 'drip', label: { en: 'Drip', es: 'Gotea' }, section: '7-204' }],
    sections: [{ section: '7-204', says: { en: 'Joints are tight', es: 'Las uniones no gotean' } }],
    acceptFromPhoto: ['note'],
  },
  weather: { isFeeFree: true, latestHoursBefore: 2 },
  lateness: { minutesBeforeLate: 15 },
  sources: { 'tests.0.headRule': { from: 'IRC 2009', section: 'P2503.5.1' } },
});
