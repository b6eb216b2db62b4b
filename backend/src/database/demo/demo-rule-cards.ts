import type { RuleCardContent, Stage, TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { DemoOrganizationKey } from './demo-people.js';
import { tallowmereVersions } from './demo-rule-card-versions.js';

type Window = RuleCardContent['asking']['windows'][number];

const work: Stage['work'] = [
  {
    code: 'permit-on-site',
    label: { en: 'Permit and approved plans on site', es: 'Permiso y planos aprobados en la obra' },
  },
  { code: 'nail-plates', label: { en: 'Nail plates', es: 'Placas protectoras' } },
  { code: 'hangers', label: { en: 'Hangers and supports', es: 'Colgadores y soportes' } },
  { code: 'slope', label: { en: 'Slope', es: 'Pendiente' } },
  { code: 'cleanouts', label: { en: 'Cleanouts', es: 'Registros de limpieza' } },
  { code: 'trap-arms', label: { en: 'Trap arms and vents', es: 'Brazos de trampa y ventilaciones' } },
  { code: 'framing', label: { en: 'Bored and notched framing', es: 'Estructura perforada y entallada' } },
  { code: 'sleeves', label: { en: 'Sleeves', es: 'Manguitos' } },
];

const frequent: RuleCardContent['corrections']['frequent'] = [
  { code: 'drip', label: { en: 'drip at a joint', es: 'gotea en una unión' }, section: '7-204' },
  { code: 'no-nail-plate', label: { en: 'no nail plate', es: 'sin placa protectora' }, section: '5-118' },
  { code: 'hanger', label: { en: 'hanger', es: 'colgador' }, section: '5-131' },
  { code: 'wrong-fitting', label: { en: 'wrong fitting', es: 'conexión equivocada' }, section: '7-210' },
  { code: 'slope', label: { en: 'slope', es: 'pendiente' }, section: '7-115' },
];

const sections: RuleCardContent['corrections']['sections'] = [
  {
    section: '7-204',
    says: {
      en: 'Joints are tight under the test of the rule card',
      es: 'Las uniones no gotean bajo la prueba de la hoja de reglas',
    },
  },
  {
    section: '5-118',
    says: {
      en: 'Pipes near the face of framing are shielded',
      es: 'Los tubos cerca de la cara de la estructura van protegidos',
    },
  },
  {
    section: '5-131',
    says: { en: 'Pipes are held at the listed spacing', es: 'Los tubos van sujetos a la distancia indicada' },
  },
  {
    section: '7-210',
    says: { en: 'Fittings turn in the direction of flow', es: 'Las conexiones giran en el sentido del flujo' },
  },
  {
    section: '7-115',
    says: { en: 'Drains fall evenly to the stack', es: 'Los desagües bajan parejo hacia la bajante' },
  },
];

const stage = (
  code: string,
  order: number,
  names: [en: string, es: string],
  inspectionCode: string,
  systems: Stage['systems'],
  covers: Stage['covers'],
  minutesPerVisit: number,
): Stage => ({
  code,
  name: { en: names[0], es: names[1] },
  inspectionCode,
  order,
  systems,
  covers,
  minutesPerVisit,
  work:
    code === 'groundwork' || code === 'under-slab'
      ? work.filter((point) => !['nail-plates', 'framing'].includes(point.code))
      : work,
});

const dwv = (
  stageCode: string,
  acceptedMethods: TestRule['acceptedMethods'],
  headRule: TestRule['headRule'],
  standMinutes: number | null,
): TestRule => ({
  stageCode,
  system: 'dwv',
  acceptedMethods,
  headRule,
  pressures: [],
  measuredAt: 'gauge',
  standMinutes,
  airOnPlastic: false,
  settleMinutes: 0,
  gaugeIncrements: [],
  mayStayIsolated: [],
  levelSeenFrom: ['sight-tube', 'overflow'],
  photoWanted: { reading: false, fix: true, takeDown: true },
});

const water = (stageCode: string, pressures: TestRule['pressures'], standMinutes: number | null): TestRule => ({
  ...dwv(stageCode, ['gauge'], null, standMinutes),
  system: 'water',
  pressures,
  settleMinutes: 60,
  levelSeenFrom: [],
  mayStayIsolated: [
    {
      en: 'Heater disconnected, or valved off both sides with its own relief valve open',
      es: 'Calentador desconectado, o cerrado por ambos lados con su propia válvula de alivio abierta',
    },
  ],
});

const window = (label: string, start: string, end: string, days: number[], room: number): Window => ({
  label,
  start,
  end,
  days,
  room,
});
const monToThu = [1, 2, 3, 4];

const tallowmere: RuleCardContent = {
  stages: [
    stage('groundwork', 1, ['Groundwork', 'Bajo losa'], '110', ['dwv'], 'slab', 20),
    stage('rough-in', 2, ['Rough-in', 'Instalación gruesa'], '210', ['dwv', 'water'], 'wall', 25),
    stage('final', 3, ['Final', 'Final'], '310', [], null, 25),
  ],
  tests: [
    dwv('groundwork', ['standpipe', 'stack-to-roof'], { kind: 'fill-level', feet: null }, null),
    dwv('rough-in', ['attic-cut', 'stack-to-roof', 'laundry-box'], { kind: 'fill-level', feet: null }, null),
    water(
      'rough-in',
      [
        { medium: 'water', minimumPsi: 100, preferredPsi: 120 },
        { medium: 'air', minimumPsi: 50, preferredPsi: 60 },
      ],
      null,
    ),
  ],
  asking: {
    windows: [
      window('early', '07:30', '09:00', [], 4),
      window('morning', '09:00', '11:00', [], 6),
      window('midday', '11:00', '13:00', monToThu, 4),
      window('afternoon', '13:30', '15:30', monToThu, 6),
    ],
    workingDays: [1, 2, 3, 4, 5],
    holidays: { federal: true, adds: [], drops: [] },
    cutoff: '15:00',
    workingDaysAhead: 1,
    horizonWorkingDays: 10,
    lotsPerRequest: 3,
    whoMayRequest: ['superintendent', 'plumber'],
    booking: 'self',
    isPermitNeeded: true,
    reinspectionWindows: null,
  },
  readiness: {
    upBy: { kind: 'clock-time', time: '07:00' },
    reminderHoursBefore: [14, 2],
    whenNotUp: 'goes-to-standby',
    isExtensionAllowed: true,
    standbyOfferMinutes: 30,
  },
  fees: [
    { event: 're-inspection', firstFree: 1, cents: 6500, payer: 'plumber', isPaidBeforeNext: false },
    { event: 'not-ready', firstFree: 1, cents: 6500, payer: 'builder', isPaidBeforeNext: true },
  ],
  corrections: { frequent, sections, acceptFromPhoto: ['note', 'fix-before-final'] },
  weather: { isFeeFree: true, latestHoursBefore: 2 },
  lateness: { minutesBeforeLate: 15 },
  sources: {
    'tests.0.headRule': { from: 'IPC', section: '312.2' },
    'tests.1.headRule': { from: 'IPC', section: '312.2' },
    'tests.1.airOnPlastic': { from: 'IPC', section: '312.3' },
    'tests.2.airOnPlastic': { from: 'IRC', section: 'P2503.7' },
  },
};

const vennick: RuleCardContent = {
  ...tallowmere,
  stages: [
    stage('groundwork', 1, ['Groundwork', 'Bajo losa'], 'P-1', ['dwv'], 'slab', 30),
    stage('rough-in', 2, ['Top-out', 'Instalación gruesa'], 'P-2', ['dwv', 'water'], 'wall', 40),
    stage('final', 3, ['Final plumbing', 'Plomería final'], 'P-9', [], null, 30),
  ],
  tests: [
    dwv('groundwork', ['standpipe', 'sectional'], { kind: 'above-highest-fitting', feet: 10 }, 15),
    dwv('rough-in', ['stack-to-roof', 'sectional'], { kind: 'above-highest-fitting', feet: 10 }, 15),
    water('rough-in', [{ medium: 'water', minimumPsi: 150, preferredPsi: 160 }], 15),
  ],
  asking: {
    ...tallowmere.asking,
    windows: [window('morning', '08:00', '12:00', [], 5), window('afternoon', '12:30', '16:30', [], 5)],
    cutoff: '14:00',
    workingDaysAhead: 2,
    horizonWorkingDays: 15,
    lotsPerRequest: 10,
    booking: 'desk',
    isPermitNeeded: false,
  },
  readiness: { ...tallowmere.readiness, upBy: { kind: 'hours-before', hours: 1 }, whenNotUp: 'stays' },
  fees: [{ event: 're-inspection', firstFree: 0, cents: 9000, payer: 'builder', isPaidBeforeNext: true }],
  sources: {
    'tests.0.headRule': { from: 'IPC', section: '312.2' },
    'tests.1.headRule': { from: 'IPC', section: '312.2' },
    'tests.1.standMinutes': { from: 'IPC', section: '312.2' },
  },
};

const ashquill: RuleCardContent = {
  ...tallowmere,
  stages: [
    stage('under-slab', 1, ['Under-slab', 'Bajo losa'], '10', ['dwv'], 'slab', 20),
    stage('rough', 2, ['Rough plumbing', 'Plomería gruesa'], '20', ['dwv', 'water'], 'wall', 30),
  ],
  tests: [
    dwv('under-slab', ['standpipe'], { kind: 'above-highest-fitting', feet: 5 }, 15),
    dwv('rough', ['laundry-riser', 'laundry-box', 'stack-to-roof'], { kind: 'above-highest-fitting', feet: 5 }, 15),
    water(
      'rough',
      [
        { medium: 'water', minimumPsi: 80, preferredPsi: null },
        { medium: 'water-topped-with-air', minimumPsi: 80, preferredPsi: 90 },
      ],
      15,
    ),
  ],
  asking: {
    ...tallowmere.asking,
    windows: [window('am', '09:00', '12:00', [1, 2, 3, 4, 5], 3), window('pm', '13:00', '16:00', [2, 4], 3)],
    cutoff: '12:00',
    lotsPerRequest: 2,
    isPermitNeeded: false,
  },
  readiness: { ...tallowmere.readiness, upBy: { kind: 'hours-before', hours: 0 }, whenNotUp: 'stays' },
  fees: [],
  sources: {
    'tests.1.headRule': { from: 'IRC 2018', section: 'P2503.5.1' },
    'tests.1.standMinutes': { from: 'IPC', section: '312.2' },
    'tests.2.standMinutes': { from: 'IRC', section: 'P2503.7' },
  },
};

export interface DemoDepartment {
  key: DemoOrganizationKey;
  zone: string;
  elevationFt: number;
  isOutside: boolean;
  ruleCard: { version: number; content: RuleCardContent } | null;
  /** Versions replaced by now, the newest first, each in force for `days`. */
  earlier?: ReadonlyArray<{ version: number; content: RuleCardContent; days: number }>;
  /** What the desk is about to change. */
  draft?: RuleCardContent;
}

/** Three departments that differ in nearly everything, and one that is not on Holdwater. */
export const demoDepartments: readonly DemoDepartment[] = [
  {
    key: 'tallowmere',
    zone: 'America/Denver',
    elevationFt: 4400,
    isOutside: false,
    ruleCard: { version: 6, content: tallowmere },
    ...tallowmereVersions(tallowmere),
  },
  {
    key: 'vennick',
    zone: 'America/Denver',
    elevationFt: 5900,
    isOutside: false,
    ruleCard: { version: 11, content: vennick },
  },
  {
    key: 'ashquill',
    zone: 'America/Los_Angeles',
    elevationFt: 210,
    isOutside: false,
    ruleCard: { version: 2, content: ashquill },
  },
  { key: 'corrow', zone: 'America/Denver', elevationFt: 5100, isOutside: true, ruleCard: null },
];
