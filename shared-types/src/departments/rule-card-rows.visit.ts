import type { RuleCardContent, Stage } from './rule-card.content.js';
import type { RuleCardRow } from './rule-card-rows.js';

type Fee = RuleCardContent['fees'][number];

/** Note 4: by when a test stands, and what follows when it, or the inspector, does not. */
export function testUpNote({ readiness, lateness }: Pick<RuleCardContent, 'readiness' | 'lateness'>): RuleCardRow[] {
  const { upBy, reminderHoursBefore, whenNotUp, isExtensionAllowed, standbyOfferMinutes } = readiness;
  const hours = [...new Set(reminderHoursBefore)].sort((a, b) => b - a);
  const { minutesBeforeLate } = lateness;
  return [
    {
      key: 'upBy',
      value: upBy,
      label: ({ t }) => t('rows.upBy'),
      lines: ({ t, clock }) => [
        upBy.kind === 'clock-time'
          ? t('says.upByClock', { time: clock(upBy.time) })
          : t('says.upByHours', { count: upBy.hours }),
      ],
    },
    {
      key: 'reminders',
      value: hours,
      label: ({ t }) => t('rows.reminders'),
      lines: ({ t }) => [
        hours.length === 0 ? t('says.systems.none') : t('says.reminders', { hours: hours.join(', ') }),
      ],
    },
    {
      key: 'notUp',
      value: whenNotUp,
      label: ({ t }) => t('rows.notUp'),
      lines: ({ t }) => [t(`says.whenNotUp.${whenNotUp}`)],
    },
    {
      key: 'extension',
      value: isExtensionAllowed,
      label: ({ t }) => t('rows.extension'),
      lines: ({ t }) => [t(isExtensionAllowed ? 'says.extension' : 'says.noExtension')],
    },
    {
      key: 'standby',
      value: standbyOfferMinutes,
      label: ({ t }) => t('rows.standby'),
      lines: ({ t }) => [t('says.standby', { count: standbyOfferMinutes })],
    },
    {
      key: 'lateness',
      value: minutesBeforeLate,
      label: ({ t }) => t('rows.lateness'),
      lines: ({ t }) => [minutesBeforeLate === 0 ? t('says.lateAtOnce') : t('says.late', { count: minutesBeforeLate })],
    },
  ];
}

/** Note 5: the stage itself, and what is looked at besides the tests. */
export function workNote(stage: Stage | undefined): RuleCardRow[] {
  if (stage === undefined) return [];
  const { work, minutesPerVisit, inspectionCode, covers, systems, order, name } = stage;
  return [
    {
      key: 'stageName',
      value: name,
      label: ({ t }) => t('rows.stageName'),
      lines: (w) => [w.name(name)],
      isQuiet: true,
    },
    { key: 'order', value: order, label: ({ t }) => t('rows.order'), lines: () => [String(order)], isQuiet: true },
    {
      key: 'systems',
      value: [...new Set(systems)].sort(),
      label: ({ t }) => t('rows.systems'),
      lines: ({ t }) => [systems.map((system) => t(`says.systems.${system}`)).join(', ') || t('says.systems.none')],
    },
    {
      key: 'lookedAt',
      value: work,
      label: ({ t }) => t('rows.lookedAt'),
      lines: (w) =>
        work.length === 0 ? [w.t('says.systems.none')] : work.map(({ label, code }) => w.name(label, code)),
    },
    {
      key: 'minutes',
      value: minutesPerVisit,
      label: ({ t }) => t('rows.minutes'),
      lines: ({ t }) => [t('says.minutes', { count: minutesPerVisit })],
    },
    {
      key: 'code',
      value: inspectionCode,
      label: ({ t }) => t('rows.code'),
      lines: ({ t }) => [inspectionCode || t('says.systems.none')],
    },
    {
      key: 'covers',
      value: covers,
      label: ({ t }) => t('rows.covers'),
      lines: ({ t }) => [t(`says.covers.${covers ?? 'nothing'}`)],
    },
  ];
}

/** Note 6: fees, and when weather spares them. */
export function feesNote({ fees, weather }: Pick<RuleCardContent, 'fees' | 'weather'>): RuleCardRow[] {
  const { isFeeFree, latestHoursBefore } = weather;
  const none: RuleCardRow[] = [
    {
      key: 'none',
      value: null,
      label: ({ t }) => t('rows.fees'),
      lines: ({ t }) => [t('says.noFees')],
      isFiller: true,
    },
  ];
  return [
    ...(fees.length === 0 ? none : fees.map((fee, index) => feeRow(fee, occurrence(fees, index)))),
    {
      key: 'weather',
      value: weather,
      label: ({ t }) => t('rows.weather'),
      lines: ({ t, more }) => [
        isFeeFree
          ? t('says.weatherFree', { count: latestHoursBefore })
          : more(t('says.weatherNotFree'), `${latestHoursBefore} h`),
      ],
    },
  ];
}

/** Two fees of one event are told apart by their place. */
function occurrence(fees: readonly Fee[], index: number): number {
  return fees.slice(0, index).filter(({ event }) => event === fees[index]?.event).length;
}

function feeRow(fee: Fee, nth: number): RuleCardRow {
  return {
    key: nth === 0 ? fee.event : `${fee.event} ${nth + 1}`,
    value: fee,
    label: ({ t }) => t(`feeEvents.${fee.event}`),
    lines: ({ t, money }) => [
      fee.firstFree === 0
        ? t('says.fee', { amount: money(fee.cents) })
        : t('says.feeAfter', { count: fee.firstFree, amount: money(fee.cents) }),
      t(`says.payer.${fee.payer}`),
      t(fee.isPaidBeforeNext ? 'says.paidBeforeNext' : 'says.notPaidBeforeNext'),
    ],
  };
}

/** Note 7: corrections the department writes often, with their sections, and what a photo is enough for. */
export function correctionsNote({
  frequent,
  acceptFromPhoto,
  sections,
}: RuleCardContent['corrections']): RuleCardRow[] {
  return [
    {
      key: 'fromPhoto',
      value: [...new Set(acceptFromPhoto)].sort(),
      label: ({ t }) => t('rows.fromPhoto'),
      lines: ({ t }) => [
        acceptFromPhoto.map((severity) => t(`severities.${severity}`)).join(', ') || t('says.onSiteOnly'),
      ],
    },
    {
      key: 'frequent',
      value: frequent,
      label: ({ t }) => t('rows.frequent'),
      lines: ({ t, name }) =>
        frequent.length === 0
          ? [t('says.systems.none')]
          : frequent.map(({ label, section, code }) =>
              section === null ? name(label, code) : t('says.withSection', { what: name(label, code), section }),
            ),
    },
    {
      key: 'sections',
      value: sections,
      label: ({ t }) => t('rows.sections'),
      lines: ({ t, name }) =>
        sections.length === 0
          ? [t('says.systems.none')]
          : sections.map(({ section, says }) => t('says.section', { section, what: name(says) })),
    },
  ];
}
