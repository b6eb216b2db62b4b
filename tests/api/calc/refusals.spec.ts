import { describe, expect, it } from 'vitest';
import { dialSample, dwvSample, holdSample, levelSample, waterSample } from './inputs/samples.js';
import { useCalcServer } from './support/calc-server.js';
import { changed, jsonWithInfinity } from './support/changed.js';

/** What is changed of a sample that is accepted, and the fields one of which the refusal must name. */
type Refusal = [changes: Record<string, unknown>, fields: string[]];

const many = <T>(count: number, make: (n: number) => T) => Array.from({ length: count }, (_, n) => make(n));
const floor = (n: number) => ({ name: `floor ${n}`, elevationFt: n });
const plug = (n: number) => ({ name: `plug ${n}`, elevationFt: 0, ratedPsi: 17 });
const pipe = () => ({ nominalIn: 3, material: 'pvc-sch40', bottomFt: 0, topFt: 1, lengthFt: 1 });
const reading = (n: number) => ({
  ...{ at: new Date(Date.parse('2027-03-02T15:00:00Z') + n * 60_000).toISOString() },
  ...{ psi: 120, temperatureF: 68, gaugeValve: 'open' },
});
const sectional = { method: 'sectional' };
const laundryOf = (method: string) => ({ method, 'laundry.floor': method === 'laundry-box' ? 'second' : 'first' });

const dwv: Refusal[] = [
  [{ colour: 1 }, ['colour']],
  [{ 'plugs.0.colour': 1 }, ['plugs.0.colour']],
  [{ 'rule.colour': 1 }, ['rule.colour']],
  [{ 'rule.headRule.colour': 1 }, ['rule.headRule.colour']],
  [{ ventTerminalFt: 'Infinity' }, ['ventTerminalFt']],
  [{ 'pipes.0.lengthFt': 'Infinity' }, ['pipes.0.lengthFt']],
  [{ ventTerminalFt: 'NaN' }, ['ventTerminalFt']],
  [{ ventTerminalFt: undefined }, ['ventTerminalFt']],
  [{ 'plugs.0.ratedPsi': 0 }, ['plugs.0.ratedPsi']],
  [{ 'plugs.0.ratedPsi': -17 }, ['plugs.0.ratedPsi']],
  [{ fillRateGpm: 0 }, ['fillRateGpm']],
  [{ fillRateGpm: -1 }, ['fillRateGpm']],
  [{ 'pipes.0.lengthFt': -1 }, ['pipes.0.lengthFt']],
  [{ riserIn: -1, ...laundryOf('laundry-riser') }, ['riserIn']],
  [{ 'rule.headRule.feet': -1 }, ['rule.headRule.feet']],
  [{ waterTempF: 31.9 }, ['waterTempF']],
  [{ waterTempF: 212.1 }, ['waterTempF']],
  [{ lowestFittingFt: 14 }, ['lowestFittingFt', 'highestFittingFt']],
  [{ 'pipes.0.bottomFt': 27 }, ['pipes.0.bottomFt', 'pipes.0.topFt']],
  [{ 'floors.1.name': 'first' }, ['floors.1.name', 'floors.0.name', 'floors']],
  [{ floors: many(21, floor), laundry: null }, ['floors']],
  [{ pipes: many(201, pipe) }, ['pipes']],
  [{ plugs: many(201, plug) }, ['plugs']],
  // a fill level above the vent terminal
  [{ atticCutFt: 26.5 }, ['atticCutFt', 'ventTerminalFt']],
  [{ method: 'standpipe', standpipeFt: 26.5 }, ['standpipeFt', 'ventTerminalFt']],
  [{ ...laundryOf('laundry-box'), 'laundry.boxOutletFt': 26.5 }, ['laundry.boxOutletFt', 'ventTerminalFt']],
  [{ ...laundryOf('laundry-riser'), 'laundry.branchFt': 25 }, ['laundry.branchFt', 'riserIn', 'ventTerminalFt']],
  // lifts that lap as far as they reach, or farther; 10 ft without a height of the rule's
  [{ ...sectional, maxSectionFt: 10 }, ['maxSectionFt', 'rule.headRule.feet']],
  [{ ...sectional, maxSectionFt: 8 }, ['maxSectionFt', 'rule.headRule.feet']],
  [{ ...sectional, maxSectionFt: 10, 'rule.headRule': { kind: 'fill-level' } }, ['maxSectionFt']],
  // required is what the chosen method uses; null means absent
  [{ atticCutFt: undefined }, ['atticCutFt']],
  [{ atticCutFt: null }, ['atticCutFt']],
  [{ method: 'standpipe', standpipeFt: undefined }, ['standpipeFt']],
  [{ ...sectional, maxSectionFt: null }, ['maxSectionFt']],
  [{ method: 'laundry-box', laundry: null }, ['laundry', 'laundry.boxOutletFt', 'laundry.floor']],
  [{ method: 'laundry-riser', laundry: undefined }, ['laundry', 'laundry.branchFt', 'laundry.floor']],
  [{ method: 'air', airPsi: null }, ['airPsi']],
  [{ method: 'air', airVolumeGal: undefined }, ['airVolumeGal']],
  // only what the design lists
  [{ method: 'smoke' }, ['method']],
  [{ pipeMaterial: 'bamboo' }, ['pipeMaterial']],
  [{ 'pipes.0.material': 'copper' }, ['pipes.0.material']],
  [{ 'pipes.0.nominalIn': 8 }, ['pipes.0.nominalIn']],
];

const water: Refusal[] = [
  [{ colour: 1 }, ['colour']],
  [{ 'gauge.colour': 1 }, ['gauge.colour']],
  [{ gaugeFt: 'Infinity' }, ['gaugeFt']],
  [{ 'rule.minimumPsi': 'NaN' }, ['rule.minimumPsi']],
  [{ 'rule.minimumPsi': undefined }, ['rule.minimumPsi']],
  [{ lowestRatedPsi: 0 }, ['lowestRatedPsi']],
  [{ lowestRatedPsi: -150 }, ['lowestRatedPsi']],
  [{ lowestRatedAirPsi: 0 }, ['lowestRatedAirPsi']],
  [{ 'gauge.incrementPsi': 0 }, ['gauge.incrementPsi']],
  [{ 'gauge.incrementPsi': -1 }, ['gauge.incrementPsi']],
  [{ 'rule.gaugeIncrements.0.incrementPsi': 0 }, ['rule.gaugeIncrements.0.incrementPsi']],
  [{ lowestFittingFt: 17.5 }, ['lowestFittingFt', 'highestOutletFt']],
  [{ waterTempF: 31.9 }, ['waterTempF']],
  [{ waterTempF: 212.1 }, ['waterTempF']],
  [{ floors: [floor(1), { ...floor(2), name: 'floor 1' }] }, ['floors.1.name', 'floors.0.name', 'floors']],
  [{ floors: many(21, floor) }, ['floors']],
  [{ medium: 'helium' }, ['medium']],
  [{ 'pipeMaterials.0': 'bamboo' }, ['pipeMaterials.0']],
];

const hold: Refusal[] = [
  [{ colour: 1 }, ['colour']],
  [{ 'readings.0.colour': 1 }, ['readings.0.colour']],
  [{ 'forecast.colour': 1 }, ['forecast.colour']],
  [{ 'readings.1.psi': 'Infinity' }, ['readings.1.psi']],
  [{ minimumPsi: 'NaN' }, ['minimumPsi']],
  [{ 'gauge.incrementPsi': 0 }, ['gauge.incrementPsi']],
  [{ 'readings.1.at': '2027-03-02T14:59:59Z' }, ['readings.1.at']],
  [{ 'readings.1.at': '2027-03-02T15:00:00Z' }, ['readings.1.at']],
  // the same instant, written with another offset
  [{ 'readings.1.at': '2027-03-02T09:00:00-06:00' }, ['readings.1.at']],
  [{ readings: many(501, reading) }, ['readings']],
  [{ 'readings.0.temperatureF': -459.67 }, ['readings.0.temperatureF']],
  [{ 'readings.0.temperatureF': -500 }, ['readings.0.temperatureF']],
  [{ 'forecast.temperatureF': -459.67 }, ['forecast.temperatureF']],
  [{ 'forecast.coldestF': -459.67 }, ['forecast.coldestF']],
  [{ 'forecast.hottestF': -460 }, ['forecast.hottestF']],
  [{ 'forecast.to': '2027-03-03T13:59:59Z' }, ['forecast.to', 'forecast.from']],
  [{ 'readings.0.at': '2027-02-30T15:00:00Z' }, ['readings.0.at']],
  [{ 'forecast.from': '2027-02-29T14:00:00Z' }, ['forecast.from']],
  // an instant has Z or an offset
  [{ 'readings.0.at': '2027-03-02T15:00:00' }, ['readings.0.at']],
  [{ 'readings.0.gaugeValve': 'ajar' }, ['readings.0.gaugeValve']],
];

const level: Refusal[] = [
  [{ 'readings.0.levelIn': -0.1 }, ['readings.0.levelIn']],
  [{ 'gauge.incrementIn': 0 }, ['gauge.incrementIn']],
  [{ 'readings.1.at': '2027-03-02T15:00:00Z' }, ['readings.1.at']],
  [{ 'readings.0.temperatureF': -459.67 }, ['readings.0.temperatureF']],
  [{ colour: 1 }, ['colour']],
];

const dial: Refusal[] = [
  [{ colour: 1 }, ['colour']],
  [{ 'needleTip.x': 'Infinity' }, ['needleTip.x']],
  [{ incrementPsi: 0 }, ['incrementPsi']],
  [{ needleTip: dialSample.center }, ['needleTip']],
  [{ zeroMark: dialSample.center }, ['zeroMark']],
  [{ fullMark: dialSample.center }, ['fullMark']],
  // one direction, twice as far
  [{ fullMark: { x: 100, y: 900 } }, ['fullMark', 'zeroMark']],
  [{ needleTip: undefined }, ['needleTip']],
];

const tables: [name: string, route: string, sample: object, refusals: Refusal[]][] = [
  ['a DWV plan', 'dwv-plan', dwvSample, dwv],
  ['a water plan', 'water-plan', waterSample, water],
  ['a log', 'hold', holdSample, hold],
  ['a DWV log', 'hold', levelSample, level],
  ['a dial', 'dial', dialSample, dial],
];

describe('what a preview cannot compute', () => {
  const server = useCalcServer();

  describe.each(tables)('%s', (_name, route, sample, refusals) => {
    it('is answered as it stands', async () => {
      expect(await server.ask(route, sample)).toMatchObject({ status: 200 });
    });

    it.each(refusals)('is refused with %j', async (changes, fields) => {
      const { status, body } = await server.ask(route, jsonWithInfinity(changed(sample, changes)));
      const { code, message } = body;
      expect({ status, code, message: typeof message }).toEqual({ status: 400, code: 'bad-input', message: 'string' });
      const named = Object.keys(body.fields ?? {});
      expect(named.filter((field) => fields.includes(field))).not.toEqual([]);
      expect(Object.values(body.fields ?? {})).not.toContain('');
    });
  });
});

describe('the edges of what is accepted', () => {
  const server = useCalcServer();

  it.each([
    ['dwv-plan', dwvSample, { waterTempF: 32 }],
    ['dwv-plan', dwvSample, { waterTempF: 212 }],
    ['dwv-plan', dwvSample, { floors: many(20, floor), laundry: null }],
    ['dwv-plan', dwvSample, { pipes: many(200, pipe), plugs: many(200, plug) }],
    ['dwv-plan', dwvSample, { lowestFittingFt: 13.5 }],
    ['dwv-plan', dwvSample, { 'pipes.0.bottomFt': 26 }],
    ['dwv-plan', dwvSample, { atticCutFt: 26 }],
    ['dwv-plan', dwvSample, { 'pipes.0.lengthFt': 0 }],
    ['dwv-plan', dwvSample, { ...sectional, maxSectionFt: 10.5 }],
    ['water-plan', waterSample, { lowestFittingFt: 17 }],
    ['water-plan', waterSample, { floors: many(20, floor) }],
    ['hold', holdSample, { readings: many(500, reading) }],
    ['hold', holdSample, { readings: [] }],
    ['hold', holdSample, { 'forecast.to': holdSample.forecast.from }],
    ['hold', levelSample, { 'readings.0.levelIn': 0 }],
    ['hold', levelSample, { readings: [] }],
  ])('%s: change %#', async (route, sample, changes) => {
    expect(await server.ask(route, changed(sample, changes))).toMatchObject({ status: 200 });
  });

  it.each([
    ['dwv-plan', dwvSample, { waterTempF: 60, elevationFt: 0, cappedVents: 0, makersAllowAir: false }],
    ['dwv-plan', changed(dwvSample, laundryOf('laundry-riser')), { riserIn: 18 }],
    ['dwv-plan', dwvSample, { 'rule.airOnPlastic': false, plugs: [], pipes: [] }],
    ['water-plan', waterSample, { waterTempF: 60, elevationFt: 0, floors: [], 'rule.measuredAt': 'gauge' }],
    ['hold', holdSample, { elevationFt: 0, settleMinutes: 0, plastic: false }],
  ])('%s takes its defaults where nothing is said', async (route, sample, defaults) => {
    const absent = Object.fromEntries(Object.keys(defaults).map((key) => [key, undefined]));
    const said = await server.answer(route, changed(sample, defaults));
    expect(await server.answer(route, changed(sample, absent))).toEqual(said);
  });
});
