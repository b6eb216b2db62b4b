import type { TestRule } from './rule-card.content.js';
import type { SourcedField } from './rule-card-rows.sources.js';

/** A model code's value for one field of a test. The department decides: local amendments go before it. */
export interface RuleCardDefault<Field extends SourcedField = SourcedField> {
  readonly field: Field;
  readonly system: TestRule['system'];
  readonly value: NonNullable<TestRule[Field]>;
  /** The code's name and its section, as they are kept in `sources`. */
  readonly from: string;
  readonly section: string;
}

type AnyDefault = { [Field in SourcedField]: RuleCardDefault<Field> }[SourcedField];

/** IRC P2503.9: increments by the test pressure, in psi. */
const gaugeIncrements: TestRule['gaugeIncrements'] = [
  { upToPsi: 10, incrementPsi: 0.1 },
  { upToPsi: 100, incrementPsi: 1 },
  { percent: 2 },
];

/**
 * Sections and values as the project's table of check values has them; two editions differ where two are offered. The section of the air
 * test, IPC 312.3, is its text on plastic pipe; its 5 psi is in the same section (from memory).
 */
export const ruleCardDefaults: readonly AnyDefault[] = [
  {
    ...{ system: 'dwv', field: 'headRule', value: { kind: 'above-highest-fitting', feet: 5 } },
    ...{ from: 'IRC 2018', section: 'P2503.5.1' },
  },
  {
    ...{ system: 'dwv', field: 'headRule', value: { kind: 'above-highest-fitting', feet: 10 } },
    ...{ from: 'IRC 2009', section: 'P2503.5.1' },
  },
  {
    ...{ system: 'dwv', field: 'headRule', value: { kind: 'fill-level', feet: null } },
    ...{ from: 'IPC', section: '312.2' },
  },
  { system: 'dwv', field: 'standMinutes', value: 15, from: 'IPC', section: '312.2' },
  { system: 'dwv', field: 'airOnPlastic', value: false, from: 'IPC', section: '312.3' },
  {
    ...{ system: 'dwv', field: 'pressures', value: [{ medium: 'air', minimumPsi: 5, preferredPsi: null }] },
    ...{ from: 'IPC', section: '312.3' },
  },
  { system: 'dwv', field: 'gaugeIncrements', value: gaugeIncrements, from: 'IRC', section: 'P2503.9' },
  {
    // "not less than the working pressure": the highest a house may be served with, where nothing else is known (IRC P2903.3.1)
    ...{ system: 'water', field: 'pressures', value: [{ medium: 'water', minimumPsi: 80, preferredPsi: null }] },
    ...{ from: 'IRC', section: 'P2503.7, P2903.3.1' },
  },
  {
    ...{ system: 'water', field: 'pressures', value: [{ medium: 'air', minimumPsi: 50, preferredPsi: null }] },
    ...{ from: 'IRC', section: 'P2503.7' },
  },
  { system: 'water', field: 'standMinutes', value: 15, from: 'IRC', section: 'P2503.7' },
  { system: 'water', field: 'airOnPlastic', value: false, from: 'IRC', section: 'P2503.7' },
  { system: 'water', field: 'gaugeIncrements', value: gaugeIncrements, from: 'IRC', section: 'P2503.9' },
];

/** What the model codes offer for one field of a test; an air pressure only where air is accepted. */
export function offeredDefaults(test: TestRule, field: SourcedField): AnyDefault[] {
  const isAirPressure = (each: AnyDefault) =>
    each.field === 'pressures' && each.value.some(({ medium }) => medium === 'air');
  const isAirTested = test.system === 'water' || test.acceptedMethods.includes('air');
  return ruleCardDefaults.filter(
    (each) => each.field === field && each.system === test.system && (isAirTested || !isAirPressure(each)),
  );
}
