import type { RuleCardContent, Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import { correctionsNote, feesNote, testUpNote, workNote } from './notes-of-visit';
import { dwvNote, waterNote } from './notes-of-test';
import type { RuleCardWords } from './rule-card-words';

export interface NoteRow {
  readonly key: string;
  readonly label: string;
  /** One line each; a list where there are several. */
  readonly lines: readonly string[];
}

/** A numbered note of a rule card; its number is its place. */
export interface Note {
  readonly key: string;
  readonly title: string;
  readonly rows: readonly NoteRow[];
}

/** What a rule card says of one stage, in words, in the seven notes every rule card has. */
export function ruleCardNotes(content: RuleCardContent, stageCode: string, words: RuleCardWords): Note[] {
  const stage = content.stages.find(({ code }) => code === stageCode);
  const testOf = (system: 'dwv' | 'water') =>
    content.tests.find((test) => test.stageCode === stageCode && test.system === system);
  return [
    windowsNote(content.asking, words),
    dwvNote(testOf('dwv'), words),
    waterNote(testOf('water'), words),
    testUpNote(content.readiness, words),
    workNote(stage, words),
    feesNote(content, words),
    correctionsNote(content.corrections, words),
  ];
}

/** Stages in the department's order. */
export function stagesInOrder({ stages }: Pick<RuleCardContent, 'stages'>): Stage[] {
  return [...stages].sort((a, b) => a.order - b.order);
}

function windowsNote(asking: RuleCardContent['asking'], words: RuleCardWords): Note {
  const { t } = words;
  return {
    key: 'windows',
    title: t('notes.windows'),
    rows: [
      {
        key: 'windows',
        label: t('rows.windows'),
        lines: asking.windows.map((window) =>
          t('says.window', {
            span: words.span(window.start, window.end),
            days: window.days.length === 0 ? t('says.everyWorkingDay') : words.days(window.days),
            room: t('says.room', { count: window.room }),
          }),
        ),
      },
      {
        key: 'booking',
        label: t('rows.booking'),
        lines: [t(`says.booking.${asking.booking}`), t('says.lotsPerRequest', { count: asking.lotsPerRequest })],
      },
      {
        key: 'whoMayRequest',
        label: t('rows.whoMayRequest'),
        lines: [asking.whoMayRequest.map((role) => t(`common.roles.${role}`)).join(', ')],
      },
      {
        key: 'cutoff',
        label: t('rows.cutoff'),
        lines: [
          t('says.cutoff', {
            time: words.clock(asking.cutoff),
            ahead: t('says.workingDaysBefore', { count: asking.workingDaysAhead }),
          }),
        ],
      },
      { key: 'horizon', label: t('rows.horizon'), lines: [t('says.horizon', { count: asking.horizonWorkingDays })] },
      {
        key: 'permit',
        label: t('rows.permit'),
        lines: [t(asking.isPermitNeeded ? 'says.permitNeeded' : 'says.permitNot')],
      },
      { key: 'days', label: t('rows.workingDays'), lines: workingDayLines(asking, words) },
      {
        key: 'reinspection',
        label: t('rows.reinspection'),
        lines: [asking.reinspectionWindows === null ? t('says.allWindows') : asking.reinspectionWindows.join(', ')],
      },
    ],
  };
}

function workingDayLines(asking: RuleCardContent['asking'], { t, days }: RuleCardWords): string[] {
  return [days(asking.workingDays), t(asking.holidays.federal ? 'says.federalClosed' : 'says.federalOpen')];
}
