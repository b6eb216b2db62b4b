import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Note, NoteRow } from './rule-card-notes';
import type { RuleCardWords } from './rule-card-words';

/** Note 2: how drains, wastes and vents are tested at a stage. */
export function dwvNote(test: TestRule | undefined, words: RuleCardWords): Note {
  const { t } = words;
  const title = t('notes.dwv');
  if (test === undefined) return { key: 'dwv', title, rows: [notAsked(words)] };
  const isAirAccepted = test.acceptedMethods.includes('air');
  return {
    key: 'dwv',
    title,
    rows: [
      {
        key: 'accepted',
        label: t('rows.accepted'),
        lines: [test.acceptedMethods.map((m) => t(`methods.${m}`)).join(', ')],
      },
      { key: 'level', label: t('rows.level'), lines: [levelLine(test, words)] },
      standRow(test, words),
      ...(isAirAccepted ? [airRow(test, words)] : []),
      { key: 'refused', label: t('rows.refused'), lines: [refusedLine(test, words)] },
      {
        key: 'seenFrom',
        label: t('rows.seenFrom'),
        lines: [test.levelSeenFrom.map((from) => t(`seenFrom.${from}`)).join(', ') || t('common.none')],
      },
      photoRow(test, words),
    ],
  };
}

/** Note 3: how water lines are tested at a stage. */
export function waterNote(test: TestRule | undefined, words: RuleCardWords): Note {
  const { t } = words;
  const title = t('notes.water');
  if (test === undefined) return { key: 'water', title, rows: [notAsked(words)] };
  return {
    key: 'water',
    title,
    rows: [
      { key: 'pressure', label: t('rows.pressure'), lines: pressureLines(test, words) },
      { key: 'measuredAt', label: t('rows.measuredAt'), lines: [t(`says.measuredAt.${test.measuredAt}`)] },
      airRow(test, words),
      standRow(test, words),
      {
        key: 'settle',
        label: t('rows.settle'),
        lines: [test.settleMinutes === 0 ? t('says.allCounted') : t('says.settle', { count: test.settleMinutes })],
      },
      {
        key: 'isolated',
        label: t('rows.isolated'),
        lines: test.mayStayIsolated.length === 0 ? [t('says.nothingIsolated')] : test.mayStayIsolated.map(words.name),
      },
      { key: 'gauge', label: t('rows.gauge'), lines: gaugeLines(test, words) },
      photoRow(test, words),
    ],
  };
}

function notAsked({ t }: RuleCardWords): NoteRow {
  return { key: 'none', label: t('rows.thisStage'), lines: [t('says.notTested')] };
}

function levelLine({ headRule }: TestRule, { t }: RuleCardWords): string {
  if (headRule === null) return t('says.levelNone');
  if (headRule.kind === 'fill-level') return t('says.levelOfMethod');
  return t('says.levelAbove', { feet: headRule.feet ?? 0 });
}

function refusedLine({ acceptedMethods, airOnPlastic }: TestRule, { t }: RuleCardWords): string {
  if (!acceptedMethods.includes('air')) return t('says.refusedAir');
  return airOnPlastic ? t('common.none') : t('says.refusedAirOnPlastic');
}

function standRow({ standMinutes }: TestRule, { t }: RuleCardWords): NoteRow {
  const line = standMinutes === null ? t('says.untilSeen') : t('says.minutes', { count: standMinutes });
  return { key: 'stand', label: t('rows.stand'), lines: [line] };
}

function airRow({ airOnPlastic }: TestRule, { t }: RuleCardWords): NoteRow {
  return { key: 'air', label: t('rows.air'), lines: [t(airOnPlastic ? 'says.airOnPlastic' : 'says.airNotOnPlastic')] };
}

function pressureLines({ pressures }: TestRule, { t }: RuleCardWords): string[] {
  return pressures.map(({ medium, minimumPsi, preferredPsi }) =>
    preferredPsi === null
      ? t('says.pressure', { psi: minimumPsi, medium: t(`media.${medium}`) })
      : t('says.pressurePreferred', { psi: minimumPsi, preferred: preferredPsi, medium: t(`media.${medium}`) }),
  );
}

function gaugeLines({ gaugeIncrements }: TestRule, { t }: RuleCardWords): string[] {
  if (gaugeIncrements.length === 0) return [t('says.anyGauge')];
  return gaugeIncrements.map((rule) =>
    'percent' in rule
      ? t('says.gaugePercent', { percent: rule.percent })
      : t('says.gaugeUpTo', { upTo: rule.upToPsi, increment: rule.incrementPsi }),
  );
}

function photoRow({ photoWanted }: TestRule, { t }: RuleCardWords): NoteRow {
  const wanted = (['reading', 'fix', 'takeDown'] as const).filter((kind) => photoWanted[kind]);
  return {
    key: 'photo',
    label: t('rows.photo'),
    lines: [wanted.map((kind) => t(`photo.${kind}`)).join(', ') || t('says.photoNone')],
  };
}
