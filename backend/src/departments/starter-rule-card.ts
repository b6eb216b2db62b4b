import { ruleCardContent, type RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';

const gaugeIncrements = [{ upToPsi: 10, incrementPsi: 0.1 }, { upToPsi: 100, incrementPsi: 1 }, { percent: 2 }];
const photoWanted = { reading: false, fix: false, takeDown: true };

const dwvTest = (stageCode: string) => ({
  stageCode,
  system: 'dwv',
  acceptedMethods: ['stack-to-roof', 'attic-cut', 'standpipe', 'sectional'],
  headRule: { kind: 'above-highest-fitting', feet: 10 },
  pressures: [],
  measuredAt: 'gauge',
  standMinutes: 15,
  airOnPlastic: false,
  settleMinutes: 0,
  gaugeIncrements,
  mayStayIsolated: [],
  levelSeenFrom: ['sight-tube', 'overflow'],
  photoWanted,
});

const waterTest = {
  ...dwvTest('rough-in'),
  system: 'water',
  acceptedMethods: ['gauge'],
  headRule: null,
  // the working pressure itself is local; 80 psi is the highest a house may be served with
  pressures: [{ medium: 'water', minimumPsi: 80, preferredPsi: null }],
  settleMinutes: 30,
  levelSeenFrom: [],
};

/**
 * What the first draft of a department without any rule card begins with: the model codes' values, each the department's to change.
 * IPC 312.2 (10 ft of head, 15 min), IRC P2503.7 and IPC 312.5 (not below working pressure, 15 min), IRC P2903.3.1 (80 psi), IRC P2503.9
 * (gauge increments), as the project's table of check values has them. Windows, cut-off and minutes: common practice, no published source.
 */
export const starterRuleCard: RuleCardContent = ruleCardContent.parse({
  stages: [
    {
      code: 'groundwork',
      name: { en: 'Groundwork', es: 'Plomería bajo losa' },
      inspectionCode: '',
      order: 1,
      systems: ['dwv'],
      covers: 'slab',
      minutesPerVisit: 30,
      work: [],
    },
    {
      code: 'rough-in',
      name: { en: 'Rough-in', es: 'Plomería oculta' },
      inspectionCode: '',
      order: 2,
      systems: ['dwv', 'water'],
      covers: 'wall',
      minutesPerVisit: 45,
      work: [],
    },
    {
      code: 'final',
      name: { en: 'Final', es: 'Final' },
      inspectionCode: '',
      order: 3,
      systems: [],
      covers: null,
      minutesPerVisit: 30,
      work: [],
    },
  ],
  tests: [dwvTest('groundwork'), dwvTest('rough-in'), waterTest],
  asking: {
    windows: [
      { label: 'morning', start: '08:00', end: '12:00', days: [], room: 4 },
      { label: 'afternoon', start: '13:00', end: '16:00', days: [], room: 4 },
    ],
    workingDays: [1, 2, 3, 4, 5],
    holidays: { federal: true, adds: [], drops: [] },
    cutoff: '15:00',
    workingDaysAhead: 1,
    horizonWorkingDays: 10,
    lotsPerRequest: 10,
    whoMayRequest: ['superintendent', 'plumber'],
    booking: 'desk',
    isPermitNeeded: true,
    reinspectionWindows: null,
  },
  readiness: {
    upBy: { kind: 'hours-before', hours: 1 },
    reminderHoursBefore: [14, 2],
    whenNotUp: 'stays',
    isExtensionAllowed: true,
    standbyOfferMinutes: 30,
  },
  fees: [],
  corrections: { frequent: [], sections: [], acceptFromPhoto: [] },
  weather: { isFeeFree: true, latestHoursBefore: 2 },
  lateness: { minutesBeforeLate: 30 },
  sources: {
    'tests.0.headRule': { from: 'IPC', section: '312.2' },
    'tests.1.headRule': { from: 'IPC', section: '312.2' },
    'tests.2.pressures': { from: 'IRC', section: 'P2503.7' },
  },
});
