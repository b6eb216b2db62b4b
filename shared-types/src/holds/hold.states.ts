export const systems = ['dwv', 'water'] as const;
export type System = (typeof systems)[number];

export const holdStates = ['standing', 'ended'] as const;
export type HoldState = (typeof holdStates)[number];

export const holdEndReasons = ['taken-down', 'lost', 'superseded', 'handed-over'] as const;
export type HoldEndReason = (typeof holdEndReasons)[number];

export const gaugeValves = ['open', 'shut'] as const;
export type GaugeValve = (typeof gaugeValves)[number];

export const media = ['water', 'water-topped-with-air', 'air'] as const;
export type Medium = (typeof media)[number];

export const dwvMethods = [
  'stack-to-roof',
  'attic-cut',
  'laundry-box',
  'laundry-riser',
  'standpipe',
  'sectional',
  'air',
] as const;
export type DwvMethod = (typeof dwvMethods)[number];
/** Water lines have one way to be tested: pumped up against a gauge. The medium says with what. */
export const waterMethods = ['gauge'] as const;
export const methods = [...dwvMethods, ...waterMethods] as const;
export type Method = (typeof methods)[number];
