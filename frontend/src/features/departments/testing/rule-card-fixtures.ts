import type { RuleCard, RuleCardBrief } from '@holdwater/shared-types/departments/departments.contract.js';
import { ruleCardContent, type RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { tallowmere } from '../../../lib/testing/people';

/** Invented rule cards for specs: the words expected of them are those of the mockup of the rule card. */
const test = { measuredAt: 'gauge', standMinutes: null, airOnPlastic: false, gaugeIncrements: [], mayStayIsolated: [] };
const photoWanted = { reading: false, fix: true, takeDown: true };

export const content: RuleCardContent = ruleCardContent.parse({
  stages: [
    {
      ...{ code: 'rough-in', name: { en: 'Rough-in' }, inspectionCode: '210', order: 1, systems: ['dwv', 'water'] },
      ...{ covers: 'wall', minutesPerVisit: 25, work: [{ code: 'slope', label: { en: 'Slope' } }] },
    },
  ],
  tests: [
    {
      ...{
        ...test,
        photoWanted,
        stageCode: 'rough-in',
        system: 'dwv',
        acceptedMethods: ['attic-cut', 'stack-to-roof'],
      },
      ...{ headRule: { kind: 'fill-level', feet: null }, pressures: [], settleMinutes: 0, levelSeenFrom: ['overflow'] },
    },
    {
      ...{ ...test, photoWanted, stageCode: 'rough-in', system: 'water', acceptedMethods: ['gauge'], headRule: null },
      ...{ pressures: [{ medium: 'water', minimumPsi: 100, preferredPsi: 120 }], settleMinutes: 60, levelSeenFrom: [] },
    },
  ],
  asking: {
    windows: [
      { label: 'early', start: '07:30', end: '09:00', days: [], room: 4 },
      { label: 'midday', start: '11:00', end: '13:00', days: [1, 2, 3, 4], room: 1 },
    ],
    workingDays: [1, 2, 3, 4, 5],
    holidays: { federal: true, adds: [], drops: [] },
    ...{ cutoff: '15:00', workingDaysAhead: 1, horizonWorkingDays: 10, lotsPerRequest: 3 },
    ...{ whoMayRequest: ['superintendent'], booking: 'self', isPermitNeeded: true, reinspectionWindows: ['midday'] },
  },
  readiness: {
    ...{ upBy: { kind: 'clock-time', time: '07:00' }, reminderHoursBefore: [2, 14], whenNotUp: 'goes-to-standby' },
    ...{ isExtensionAllowed: true, standbyOfferMinutes: 30 },
  },
  fees: [{ event: 're-inspection', firstFree: 1, cents: 6500, payer: 'plumber', isPaidBeforeNext: false }],
  corrections: { frequent: [], sections: [], acceptFromPhoto: ['note'] },
  weather: { isFeeFree: true, latestHoursBefore: 2 },
  lateness: { minutesBeforeLate: 15 },
  sources: {},
});

export const briefOf = (version: number, state: RuleCardBrief['state']): RuleCardBrief => ({
  id: `5a0f8a52-6c1e-4f6e-9a86-${String(version).padStart(12, '0')}`,
  departmentId: tallowmere.id,
  ...{ version, state, isInForce: state === 'published', effectiveTo: null },
  effectiveFrom: state === 'published' ? '2026-01-02' : null,
});

export const cardOf = (version: number, state: RuleCardBrief['state'], said = content): RuleCard => ({
  ...briefOf(version, state),
  ...{ departmentName: tallowmere.name, zone: 'America/Denver', content: said, publishedAt: null, edited: null },
});

export const department = {
  ...{ id: tallowmere.id, name: tallowmere.name, phone: '555-0160', zone: 'America/Denver', elevationFt: 4400 },
  ...{ isOutside: false, ruleCard: briefOf(6, 'published') },
};
