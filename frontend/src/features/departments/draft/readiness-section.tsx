import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { useRuleCardWords } from '../rule-card-words';
import { CheckField } from './check-fields';
import { DraftSection } from './draft-section';
import { ListFields } from './list-fields';
import { NumberField, WhenField } from './text-fields';

type Readiness = RuleCardContent['readiness'];
type Lateness = RuleCardContent['lateness'];

export interface ReadinessSectionProps {
  value: Readiness;
  lateness: Lateness;
  onChange: (value: Readiness) => void;
  onLateness: (value: Lateness) => void;
}

/** By when a test stands, reminders, and what follows when it, or the inspector, does not come in time. */
export function ReadinessSection({ value, lateness, onChange, onLateness }: ReadinessSectionProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const { upBy } = value;
  const kinds = {
    'clock-time': { kind: 'clock-time', time: '07:00' },
    'hours-before': { kind: 'hours-before', hours: 1 },
  } as const;
  return (
    <DraftSection title={words.t('notes.testUp')} paths={['readiness', 'lateness']}>
      <Choice
        label={words.t('rows.upBy')}
        isLabelShown
        options={(['clock-time', 'hours-before'] as const).map((kind) => ({
          value: kind,
          label: t(`form.upBy.${kind}`),
        }))}
        value={upBy.kind}
        onChange={(kind) => onChange({ ...value, upBy: kinds[kind] })}
      />
      {upBy.kind === 'clock-time' ? (
        <WhenField
          type="time"
          label={words.t('rows.upBy')}
          path="readiness.upBy.time"
          value={upBy.time}
          onChange={(time) => onChange({ ...value, upBy: { ...upBy, time } })}
        />
      ) : (
        <NumberField
          label={t('form.hoursBefore')}
          unit="h"
          path="readiness.upBy.hours"
          value={upBy.hours}
          onChange={(hours) => onChange({ ...value, upBy: { ...upBy, hours } })}
        />
      )}
      <ListFields
        items={value.reminderHoursBefore}
        fresh={() => 2}
        addWord={t('form.addReminder')}
        nameOf={(index) => t('form.reminder', { number: index + 1 })}
        onChange={(reminderHoursBefore) => onChange({ ...value, reminderHoursBefore })}
      >
        {(hours, index, change) => (
          <NumberField
            label={t('form.hoursBefore')}
            unit="h"
            path={`readiness.reminderHoursBefore.${index}`}
            value={hours}
            onChange={change}
          />
        )}
      </ListFields>
      <Choice
        label={words.t('rows.notUp')}
        isLabelShown
        stacked
        options={(['goes-to-standby', 'stays'] as const).map((each) => ({
          value: each,
          label: words.t(`says.whenNotUp.${each}`),
        }))}
        value={value.whenNotUp}
        onChange={(whenNotUp) => onChange({ ...value, whenNotUp })}
      />
      <CheckField
        label={t('form.extension')}
        value={value.isExtensionAllowed}
        onChange={(isExtensionAllowed) => onChange({ ...value, isExtensionAllowed })}
      />
      <div className="fields two">
        <NumberField
          label={t('form.standby')}
          unit="min"
          path="readiness.standbyOfferMinutes"
          value={value.standbyOfferMinutes}
          onChange={(standbyOfferMinutes) => onChange({ ...value, standbyOfferMinutes })}
        />
        <NumberField
          label={t('form.late')}
          unit="min"
          path="lateness.minutesBeforeLate"
          value={lateness.minutesBeforeLate}
          onChange={(minutesBeforeLate) => onLateness({ minutesBeforeLate })}
        />
      </div>
    </DraftSection>
  );
}
