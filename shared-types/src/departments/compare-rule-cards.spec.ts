import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changeSentence, changesForStages, compareRuleCards } from './compare-rule-cards.js';
import { type RuleCardContent, ruleCardContent } from './rule-card.content.js';
import { everyChange } from './testing/every-change.js';
import { wholeRuleCard } from './testing/whole-rule-card.js';

const changes = everyChange(wholeRuleCard).filter(({ path }) => !/^tests\.1\.acceptedMethods\.0$/.test(path));
const isEqual = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

describe('two versions of a rule card compared', () => {
  it('has every field of the contract in the rule card the specs change', () => {
    // the schema is the list: what it parses to names each field once
    const names = new Set(JSON.stringify(wholeRuleCard).match(/"(\w+)":/g));
    const declared = JSON.stringify(ruleCardContent.toJSONSchema({ unrepresentable: 'any' })).match(
      /"required":\[[^\]]*\]/g,
    );
    const required = new Set(
      (declared ?? []).flatMap((list) => list.slice(11).match(/"\w+"/g) ?? []).map((n) => `${n}:`),
    );
    // of the ways a test may be due up, the other one has its own field; of a source, both are named
    expect([...required].filter((name) => !names.has(name))).toEqual(['"hours":']);
    expect(changes.length).toBeGreaterThan(100);
  });

  it('tells nothing where nothing differs, whatever the order of keys and of sets', () => {
    expect(compareRuleCards(wholeRuleCard, structuredClone(wholeRuleCard))).toEqual([]);
    const asking = { ...wholeRuleCard.asking, workingDays: [5, 4, 3, 2, 1] };
    const turned = Object.fromEntries(Object.entries({ ...wholeRuleCard, asking }).reverse()) as RuleCardContent;
    expect(compareRuleCards(wholeRuleCard, turned)).toEqual([]);
  });

  it.each(changes.map((one) => [one.path, one] as const))(
    'tells of %s once, in both languages',
    (_path, { changed }) => {
      const told = compareRuleCards(wholeRuleCard, changed);
      // a window's label or span is told where re-inspections name the window, too
      expect(new Set(told.map(({ note, row, stageCode }) => `${stageCode} ${note} ${row}`)).size).toBe(told.length);
      expect(told.length).toBeGreaterThanOrEqual(1);
      for (const change of told) {
        for (const locale of ['en', 'es'] as const) {
          expect(isEqual(change.before?.[locale], change.after?.[locale])).toBe(false);
          expect(changeSentence(change, locale)).not.toMatch(/\{\{|undefined|null|^:/);
        }
      }
    },
  );

  it('tells one change as one, but where a value stands in for two rows', () => {
    const many = changes.filter(({ changed }) => compareRuleCards(wholeRuleCard, changed).length > 1);
    // another event is another fee: one goes, one comes
    expect(many.map(({ path }) => path)).toEqual(['fees.0.event']);
  });

  it('tells the changes of two fields as those of each', () => {
    fc.assert(
      fc.property(fc.nat(changes.length - 1), fc.nat(changes.length - 1), (i, j) => {
        const [one, other] = [changes[i], changes[j]];
        if (one === undefined || other === undefined) return;
        const key = ({ note, row, stageCode }: ReturnType<typeof compareRuleCards>[number]) =>
          `${stageCode} ${note} ${row}`;
        const there = compareRuleCards(one.changed, other.changed).map(key);
        const back = compareRuleCards(other.changed, one.changed).map(key);
        expect(new Set(there)).toEqual(new Set(back));
        expect(there.length === 0).toBe(isEqual(one.changed, other.changed));
      }),
    );
  });

  it('says the changes of the design’s drawing of a rule card in its words', () => {
    // mockup H: "60 psi with air" instead of 50, up by 6:30 am instead of 7:00 am
    const pressures = (air: number) => [
      { medium: 'water' as const, minimumPsi: 100, preferredPsi: null },
      { medium: 'air' as const, minimumPsi: air, preferredPsi: null },
    ];
    const [dwv, water] = wholeRuleCard.tests;
    const version = (air: number, time: string): RuleCardContent => ({
      ...wholeRuleCard,
      tests: [dwv!, { ...water!, pressures: pressures(air) }],
      readiness: { ...wholeRuleCard.readiness, upBy: { kind: 'clock-time', time } },
    });
    const told = compareRuleCards(version(50, '07:00'), version(60, '06:30'));
    expect(told.map((change) => changeSentence(change, 'en'))).toEqual([
      'Test up, Up by: 6:30 am on the day (before: 7:00 am on the day)',
      'Rough-in, Water, Pressure: 100 psi with water; 60 psi with air (before: 100 psi with water; 50 psi with air)',
    ]);
    expect(changeSentence(told[1]!, 'es')).toBe(
      'Gruesa, Agua, Presión: 100 psi con agua; 60 psi con aire (antes: 100 psi con agua; 50 psi con aire)',
    );
    expect(changesForStages(told, ['groundwork']).map(({ row }) => row)).toEqual(['upBy']);
  });

  it('tells a code or a translation that the plain words do not show', () => {
    const renamed = everyChange(wholeRuleCard).find(({ path }) => path === 'stages.1.work.0.label.es')!;
    const [change] = compareRuleCards(wholeRuleCard, renamed.changed);
    expect(change?.before?.en).toEqual(['Slope / Pendiente (slope)']);
    expect(change?.after?.en).toEqual(['Slope / Pendientex (slope)']);
  });

  it('tells of a stage that comes and of a test that goes, without what is of no use to a reader', () => {
    const [groundwork, roughIn] = wholeRuleCard.stages;
    const without = { ...wholeRuleCard, stages: [groundwork!, { ...roughIn!, systems: ['dwv' as const] }] };
    const told = compareRuleCards(wholeRuleCard, { ...without, tests: wholeRuleCard.tests.slice(0, 1) });
    expect(told.filter(({ note }) => note === 'water').every(({ after }) => after === null)).toBe(true);
    expect(told.find(({ row }) => row === 'systems')?.after?.en).toEqual(['DWV']);
    const added = compareRuleCards({ ...wholeRuleCard, stages: [roughIn!] }, wholeRuleCard);
    expect(added.every(({ stageCode, before }) => stageCode === 'groundwork' && before === null)).toBe(true);
  });
});
