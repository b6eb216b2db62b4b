import type { RuleCardContent } from './rule-card.content.js';
import type { RuleCardRow } from './rule-card-rows.js';
import type { RuleCardWords } from './rule-card-words.js';

type Asking = RuleCardContent['asking'];
type Window = Asking['windows'][number];

/** Note 1: windows, and how and by when they are asked for. */
export function windowsNote(asking: Asking): RuleCardRow[] {
  const { windows, reinspectionWindows, workingDays, holidays, cutoff, workingDaysAhead } = asking;
  return [
    {
      key: 'windows',
      value: windows.map((window) => ({ ...window, days: inOrder(window.days) })),
      label: ({ t }) => t('rows.windows'),
      lines: (words) => windows.map((window) => windowLine(window, words)),
    },
    {
      key: 'booking',
      value: [asking.booking, asking.lotsPerRequest],
      label: ({ t }) => t('rows.booking'),
      lines: ({ t }) => [
        t(`says.booking.${asking.booking}`),
        t('says.lotsPerRequest', { count: asking.lotsPerRequest }),
      ],
    },
    {
      key: 'whoMayRequest',
      value: [...new Set(asking.whoMayRequest)].sort(),
      label: ({ t }) => t('rows.whoMayRequest'),
      lines: ({ t }) => [asking.whoMayRequest.map((role) => t(`roles.${role}`)).join(', ')],
    },
    {
      key: 'cutoff',
      value: [cutoff, workingDaysAhead],
      label: ({ t }) => t('rows.cutoff'),
      lines: ({ t, clock }) => [
        t('says.cutoff', { time: clock(cutoff), ahead: t('says.workingDaysBefore', { count: workingDaysAhead }) }),
      ],
    },
    {
      key: 'horizon',
      value: asking.horizonWorkingDays,
      label: ({ t }) => t('rows.horizon'),
      lines: ({ t }) => [t('says.horizon', { count: asking.horizonWorkingDays })],
    },
    {
      key: 'permit',
      value: asking.isPermitNeeded,
      label: ({ t }) => t('rows.permit'),
      lines: ({ t }) => [t(asking.isPermitNeeded ? 'says.permitNeeded' : 'says.permitNot')],
    },
    {
      key: 'workingDays',
      value: inOrder(workingDays),
      label: ({ t }) => t('rows.workingDays'),
      lines: ({ days }) => [days(workingDays)],
    },
    {
      key: 'holidays',
      value: { ...holidays, adds: unique(holidays.adds), drops: unique(holidays.drops) },
      label: ({ t }) => t('rows.holidays'),
      lines: ({ t, date }) => [
        t(holidays.federal ? 'says.federalClosed' : 'says.federalOpen'),
        ...unique(holidays.adds).map((day) => t('says.addedDay', { date: date(day) })),
        ...unique(holidays.drops).map((day) => t('says.droppedDay', { date: date(day) })),
      ],
    },
    {
      key: 'reinspection',
      value: reinspectionWindows === null ? null : unique(reinspectionWindows),
      label: ({ t }) => t('rows.reinspection'),
      lines: (words) => [reinspectionLine(asking, words)],
    },
  ];
}

function windowLine({ label, start, end, days, room }: Window, words: RuleCardWords): string {
  const { t } = words;
  const line = t('says.window', {
    span: words.span(start, end),
    days: days.length === 0 ? t('says.everyWorkingDay') : words.days(days),
    room: t('says.room', { count: room }),
  });
  return words.more(line, label);
}

/** The windows' spans rather than their names: those are the department's own. */
function reinspectionLine({ windows, reinspectionWindows }: Asking, words: RuleCardWords): string {
  if (reinspectionWindows === null) return words.t('says.allWindows');
  if (reinspectionWindows.length === 0) return words.t('says.reinspectionNone');
  return reinspectionWindows
    .map((label) => {
      const window = windows.find((each) => each.label === label);
      return window === undefined ? label : words.more(words.span(window.start, window.end), label);
    })
    .join(', ');
}

function inOrder(days: readonly number[]): number[] {
  return [...new Set(days)].sort((a, b) => a - b);
}

function unique(words: readonly string[]): string[] {
  return [...new Set(words)].sort();
}
