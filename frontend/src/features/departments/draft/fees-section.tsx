import { feeEvents, type RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { useRuleCardWords } from '../rule-card-words';
import { CheckField, PartFault } from './check-fields';
import { DraftSection } from './draft-section';
import { ListFields } from './list-fields';
import { NumberField } from './text-fields';

type Fee = RuleCardContent['fees'][number];
type Weather = RuleCardContent['weather'];

export interface FeesSectionProps {
  fees: readonly Fee[];
  weather: Weather;
  onFees: (fees: Fee[]) => void;
  onWeather: (weather: Weather) => void;
}

/** What is charged when, who pays, and when weather spares it. */
export function FeesSection({ fees, weather, onFees, onWeather }: FeesSectionProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const unused = feeEvents.find((event) => !fees.some((fee) => fee.event === event)) ?? 're-inspection';
  return (
    <DraftSection title={words.t('notes.fees')} paths={['fees', 'weather']}>
      <ListFields
        items={fees}
        fresh={(): Fee => ({ event: unused, firstFree: 0, cents: 5000, payer: 'builder', isPaidBeforeNext: false })}
        addWord={t('form.addFee')}
        nameOf={(index) => t('form.fee', { number: index + 1 })}
        onChange={onFees}
      >
        {(fee, index, change) => <FeeFields fee={fee} path={`fees.${index}`} onChange={change} />}
      </ListFields>
      <CheckField
        label={t('form.weatherFree')}
        value={weather.isFeeFree}
        onChange={(isFeeFree) => onWeather({ ...weather, isFeeFree })}
      />
      <NumberField
        label={t('form.weatherHours')}
        unit="h"
        path="weather.latestHoursBefore"
        value={weather.latestHoursBefore}
        onChange={(latestHoursBefore) => onWeather({ ...weather, latestHoursBefore })}
      />
    </DraftSection>
  );
}

function FeeFields({ fee, path, onChange }: { fee: Fee; path: string; onChange: (fee: Fee) => void }): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  return (
    <>
      <Choice
        label={t('form.feeFor')}
        isLabelShown
        options={feeEvents.map((event) => ({ value: event, label: words.t(`feeEvents.${event}`) }))}
        value={fee.event}
        onChange={(event) => onChange({ ...fee, event })}
      />
      <PartFault path={`${path}.event`} />
      <div className="fields two">
        <NumberField
          label={t('form.dollars')}
          unit="$"
          path={`${path}.cents`}
          value={fee.cents / 100}
          // kept in whole cents
          onChange={(dollars) => onChange({ ...fee, cents: Math.round(dollars * 100) })}
        />
        <NumberField
          label={t('form.firstFree')}
          path={`${path}.firstFree`}
          value={fee.firstFree}
          onChange={(firstFree) => onChange({ ...fee, firstFree })}
        />
      </div>
      <Choice
        label={t('form.payer')}
        isLabelShown
        options={(['builder', 'plumber'] as const).map((payer) => ({
          value: payer,
          label: words.t(`says.payer.${payer}`),
        }))}
        value={fee.payer}
        onChange={(payer) => onChange({ ...fee, payer })}
      />
      <CheckField
        label={words.t('says.paidBeforeNext')}
        value={fee.isPaidBeforeNext}
        onChange={(isPaidBeforeNext) => onChange({ ...fee, isPaidBeforeNext })}
      />
    </>
  );
}
