import type { RuleCardContent, Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Note } from './rule-card-notes';
import type { RuleCardWords } from './rule-card-words';

/** Note 4: by when a test stands, and what follows when it does not. */
export function testUpNote(readiness: RuleCardContent['readiness'], { t, clock }: RuleCardWords): Note {
  const { upBy, reminderHoursBefore, whenNotUp, isExtensionAllowed, standbyOfferMinutes } = readiness;
  const hours = [...reminderHoursBefore].sort((a, b) => b - a).join(', ');
  return {
    key: 'testUp',
    title: t('notes.testUp'),
    rows: [
      {
        key: 'upBy',
        label: t('rows.upBy'),
        lines: [
          upBy.kind === 'clock-time'
            ? t('says.upByClock', { time: clock(upBy.time) })
            : t('says.upByHours', { count: upBy.hours }),
        ],
      },
      {
        key: 'reminders',
        label: t('rows.reminders'),
        lines: [hours === '' ? t('common.none') : t('says.reminders', { hours })],
      },
      { key: 'notUp', label: t('rows.notUp'), lines: [t(`says.whenNotUp.${whenNotUp}`)] },
      {
        key: 'extension',
        label: t('rows.extension'),
        lines: [t(isExtensionAllowed ? 'says.extension' : 'says.noExtension')],
      },
      { key: 'standby', label: t('rows.standby'), lines: [t('says.standby', { count: standbyOfferMinutes })] },
    ],
  };
}

/** Note 5: what is looked at besides, at this stage. */
export function workNote(stage: Stage | undefined, { t, name }: RuleCardWords): Note {
  const title = t('notes.work');
  if (stage === undefined) return { key: 'work', title, rows: [] };
  return {
    key: 'work',
    title,
    rows: [
      {
        key: 'lookedAt',
        label: t('rows.lookedAt'),
        lines: stage.work.length === 0 ? [t('common.none')] : stage.work.map(({ label }) => name(label)),
      },
      { key: 'minutes', label: t('rows.minutes'), lines: [t('says.minutes', { count: stage.minutesPerVisit })] },
      { key: 'code', label: t('rows.code'), lines: [stage.inspectionCode || t('common.none')] },
      { key: 'covers', label: t('rows.covers'), lines: [t(`says.covers.${stage.covers ?? 'nothing'}`)] },
    ],
  };
}

/** Note 6: fees, and when weather spares them. */
export function feesNote({ fees, weather }: RuleCardContent, { t, locale }: RuleCardWords): Note {
  const money = new Intl.NumberFormat(locale === 'es' ? 'es-US' : 'en-US', {
    style: 'currency',
    currency: 'USD',
    minimumFractionDigits: 0,
    maximumFractionDigits: 2,
  });
  const rows = fees.map((fee) => ({
    key: fee.event,
    label: t(`feeEvents.${fee.event}`),
    lines: [
      fee.firstFree === 0
        ? t('says.fee', { amount: money.format(fee.cents / 100) })
        : t('says.feeAfter', { count: fee.firstFree, amount: money.format(fee.cents / 100) }),
      t(`says.payer.${fee.payer}`),
      ...(fee.isPaidBeforeNext ? [t('says.paidBeforeNext')] : []),
    ],
  }));
  const none = { key: 'none', label: t('rows.fees'), lines: [t('says.noFees')] };
  return {
    key: 'fees',
    title: t('notes.fees'),
    rows: [
      ...(rows.length === 0 ? [none] : rows),
      {
        key: 'weather',
        label: t('rows.weather'),
        lines: [
          weather.isFeeFree ? t('says.weatherFree', { count: weather.latestHoursBefore }) : t('says.weatherNotFree'),
        ],
      },
    ],
  };
}

/** Note 7: corrections the department writes often, with their sections, and what a photo is enough for. */
export function correctionsNote(corrections: RuleCardContent['corrections'], { t, name }: RuleCardWords): Note {
  const { frequent, acceptFromPhoto, sections } = corrections;
  const fromPhoto = acceptFromPhoto.map((severity) => t(`severities.${severity}`)).join(', ');
  return {
    key: 'corrections',
    title: t('notes.corrections'),
    rows: [
      { key: 'fromPhoto', label: t('rows.fromPhoto'), lines: [fromPhoto === '' ? t('says.onSiteOnly') : fromPhoto] },
      {
        key: 'frequent',
        label: t('rows.frequent'),
        lines:
          frequent.length === 0
            ? [t('common.none')]
            : frequent.map(({ label, section }) =>
                section === null ? name(label) : t('says.withSection', { what: name(label), section }),
              ),
      },
      {
        key: 'sections',
        label: t('rows.sections'),
        lines:
          sections.length === 0
            ? [t('common.none')]
            : sections.map(({ section, says }) => t('says.section', { section, what: name(says) })),
      },
    ],
  };
}
