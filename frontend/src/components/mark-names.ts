/** The colour a state's word takes; class `t-<tone>`. */
export type MarkTone = 'ink' | 'ink2' | 'ink3' | 'primer' | 'water' | 'brass' | 'green' | 'red';

/** Every mark of the interface guide with the colour of its word. Words: `marks.<name>` in the translations. */
export const markTones = {
  requested: 'ink2',
  booked: 'ink',
  'part-up': 'ink',
  ready: 'water',
  underway: 'primer',
  withdrawn: 'ink3',
  declined: 'ink2',
  freed: 'brass',
  standby: 'ink2',
  pass: 'green',
  fail: 'red',
  'not-seen': 'ink2',
  'not-ready': 'brass',
  'no-access': 'ink',
  'not-looked-at': 'ink2',
  'looked-at': 'ink',
  clear: 'green',
  'put-back-due': 'green',
  'corrections-open': 'red',
  'awaiting-visit': 'water',
  'under-test': 'water',
  'not-tested': 'ink3',
  'correction-open': 'red',
  'correction-fixed': 'brass',
  'correction-accepted': 'green',
  'test-holds': 'water',
  'test-temperature': 'water',
  'test-short': 'brass',
  'test-losing': 'red',
  'test-slow-fall': 'ink',
  'test-settling': 'ink3',
  'test-gauge': 'brass',
  'test-few': 'ink3',
  'test-over': 'red',
  'test-ended': 'ink3',
  level: 'water',
  now: 'primer',
  'waits-on-you': 'brass',
  'waits-on': 'brass',
  'past-time': 'red',
  photo: 'ink',
  sending: 'brass',
  sent: 'green',
  'no-signal': 'ink',
} as const satisfies Record<string, MarkTone>;

export type MarkName = keyof typeof markTones;

/** All names, in the guide's order. */
export const markNames = Object.keys(markTones) as MarkName[];

/** Narrows a code from the server to a mark's name. */
export function isMarkName(code: string): code is MarkName {
  return Object.hasOwn(markTones, code);
}
