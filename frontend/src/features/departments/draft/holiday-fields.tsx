import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { CheckField } from './check-fields';
import { ListFields } from './list-fields';
import { WhenField } from './text-fields';

type Holidays = RuleCardContent['asking']['holidays'];

/** Days off of every year: the federal list, with what the department adds to it and leaves out of it. */
export function HolidayFields({
  value,
  onChange,
}: {
  value: Holidays;
  onChange: (value: Holidays) => void;
}): ReactNode {
  const { t } = useTranslation('departments');
  return (
    <>
      <CheckField
        label={t('form.federal')}
        value={value.federal}
        onChange={(federal) => onChange({ ...value, federal })}
      />
      {(['adds', 'drops'] as const).map((list) => (
        <ListFields
          key={list}
          items={value[list]}
          fresh={() => ''}
          addWord={t(`form.${list}`)}
          nameOf={(index) => t(`form.${list}Named`, { number: index + 1 })}
          onChange={(days) => onChange({ ...value, [list]: days })}
        >
          {(day, index, change) => (
            <WhenField
              type="date"
              label={t('closures.date')}
              path={`asking.holidays.${list}.${index}`}
              value={day}
              onChange={change}
            />
          )}
        </ListFields>
      ))}
    </>
  );
}
