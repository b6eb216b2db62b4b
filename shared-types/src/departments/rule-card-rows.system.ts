import type { TestRule } from './rule-card.content.js';
import type { RuleCardRow } from './rule-card-rows.js';
import type { RuleCardWords } from './rule-card-words.js';

/** Notes 2 and 3: how drains, wastes and vents, or water lines, are tested at a stage. */
export function testNote(test: TestRule | undefined, system: TestRule['system']): RuleCardRow[] {
  if (test === undefined) {
    return [{ key: 'none', value: null, ...said('rows.thisStage', ({ t }) => [t('says.notTested')]), isFiller: true }];
  }
  const isDwv = system === 'dwv';
  const withAir = test.acceptedMethods.includes('air') || test.pressures.some(({ medium }) => medium !== 'water');
  return [
    acceptedRow(test, !isDwv),
    { key: 'level', value: test.headRule, ...said('rows.level', (words) => [levelLine(test, words)]), isQuiet: !isDwv },
    {
      key: 'pressure',
      value: test.pressures,
      ...said('rows.pressure', (words) => pressureLines(test, words)),
      isQuiet: isDwv && test.pressures.length === 0,
    },
    {
      key: 'measuredAt',
      value: test.measuredAt,
      ...said('rows.measuredAt', ({ t }) => [t(`says.measuredAt.${test.measuredAt}`)]),
      isQuiet: isDwv && !withAir,
    },
    {
      key: 'air',
      value: test.airOnPlastic,
      ...said(isDwv ? 'rows.refused' : 'rows.air', (words) => [airLine(test, words)]),
    },
    {
      key: 'airRules',
      value: test.airRules ?? null,
      ...said('rows.airRules', (words) => airLines(test, words)),
      isQuiet: test.airRules === undefined || !withAir,
    },
    standRow(test),
    {
      key: 'settle',
      value: test.settleMinutes,
      ...said('rows.settle', ({ t }) => [
        test.settleMinutes === 0 ? t('says.allCounted') : t('says.settle', { count: test.settleMinutes }),
      ]),
      isQuiet: isDwv,
    },
    {
      key: 'isolated',
      value: test.mayStayIsolated,
      ...said('rows.isolated', ({ t, name }) =>
        test.mayStayIsolated.length === 0 ? [t('says.nothingIsolated')] : test.mayStayIsolated.map((own) => name(own)),
      ),
      isQuiet: isDwv && test.mayStayIsolated.length === 0,
    },
    {
      key: 'gauge',
      value: test.gaugeIncrements,
      ...said('rows.gauge', (words) => gaugeLines(test, words)),
      isQuiet: isDwv && !withAir,
    },
    {
      key: 'seenFrom',
      value: [...new Set(test.levelSeenFrom)].sort(),
      ...said('rows.seenFrom', ({ t }) => [
        test.levelSeenFrom.map((from) => t(`seenFrom.${from}`)).join(', ') || t('says.systems.none'),
      ]),
      isQuiet: !isDwv,
    },
    photoRow(test),
  ];
}

function said(label: string, lines: RuleCardRow['lines']): Pick<RuleCardRow, 'label' | 'lines'> {
  return { label: ({ t }) => t(label), lines };
}

function acceptedRow({ acceptedMethods }: TestRule, isQuiet: boolean): RuleCardRow {
  return {
    key: 'accepted',
    value: [...new Set(acceptedMethods)].sort(),
    ...said('rows.accepted', ({ t }) => [acceptedMethods.map((method) => t(`methods.${method}`)).join(', ')]),
    isQuiet,
  };
}

function levelLine({ headRule }: TestRule, { t, more }: RuleCardWords): string {
  if (headRule === null) return t('says.levelNone');
  if (headRule.kind === 'fill-level') {
    return headRule.feet === null ? t('says.levelOfMethod') : more(t('says.levelOfMethod'), `${headRule.feet} ft`);
  }
  return headRule.feet === null
    ? more(t('says.levelAbove', { feet: 0 }), '–')
    : t('says.levelAbove', { feet: headRule.feet });
}

/** Of drains, what is refused: air at all where no way with air is accepted, else air on plastic. Of lines, where air may go. */
function airLine({ system, acceptedMethods, airOnPlastic }: TestRule, { t, more }: RuleCardWords): string {
  const onPlastic = t(airOnPlastic ? 'says.airOnPlastic' : 'says.airNotOnPlastic');
  if (system === 'water') return onPlastic;
  if (!acceptedMethods.includes('air')) return more(t('says.refusedAir'), onPlastic);
  return airOnPlastic ? t('says.systems.none') : t('says.refusedAirOnPlastic');
}

function standRow({ standMinutes }: TestRule): RuleCardRow {
  return {
    key: 'stand',
    value: standMinutes,
    ...said('rows.stand', ({ t }) => [
      standMinutes === null ? t('says.untilSeen') : t('says.minutes', { count: standMinutes }),
    ]),
  };
}

function pressureLines({ pressures }: TestRule, { t }: RuleCardWords): string[] {
  if (pressures.length === 0) return [t('says.pressureNone')];
  return pressures.map(({ medium, minimumPsi, preferredPsi }) =>
    preferredPsi === null
      ? t('says.pressure', { psi: minimumPsi, medium: t(`media.${medium}`) })
      : t('says.pressurePreferred', { psi: minimumPsi, preferred: preferredPsi, medium: t(`media.${medium}`) }),
  );
}

function airLines({ airRules }: TestRule, { t }: RuleCardWords): string[] {
  if (airRules === undefined) return [t('says.airRulesNone')];
  return [
    ...(airRules.highestPsi === null ? [] : [t('says.airHighest', { psi: airRules.highestPsi })]),
    t(airRules.needsMakersConsent ? 'says.airConsent' : 'says.airNoConsent'),
    t(airRules.needsReliefValve ? 'says.airRelief' : 'says.airNoRelief'),
  ];
}

function gaugeLines({ gaugeIncrements }: TestRule, { t }: RuleCardWords): string[] {
  if (gaugeIncrements.length === 0) return [t('says.anyGauge')];
  return gaugeIncrements.map((rule) =>
    'percent' in rule
      ? t('says.gaugePercent', { percent: rule.percent })
      : t('says.gaugeUpTo', { upTo: rule.upToPsi, increment: rule.incrementPsi }),
  );
}

function photoRow({ photoWanted }: TestRule): RuleCardRow {
  return {
    key: 'photo',
    value: photoWanted,
    ...said('rows.photo', ({ t }) => [
      (['reading', 'fix', 'takeDown'] as const)
        .filter((kind) => photoWanted[kind])
        .map((kind) => t(`photo.${kind}`))
        .join(', ') || t('says.photoNone'),
    ]),
  };
}
