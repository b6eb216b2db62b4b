import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { useRuleCardWords } from '../rule-card-words';
import { CheckField, CheckList } from './check-fields';
import { DraftSection } from './draft-section';
import { HolidayFields } from './holiday-fields';
import { NumberField, WhenField } from './text-fields';
import { WindowsFields } from './windows-fields';

export type Asking = RuleCardContent['asking'];
const numbers = ['workingDaysAhead', 'horizonWorkingDays', 'lotsPerRequest'] as const;
const weekdays = [1, 2, 3, 4, 5, 6, 7] as const;

/** Windows, working days, and how and by when they are asked for. */
export function AskingSection({
  value,
  onChange,
}: {
  value: Asking;
  onChange: (path: string, value: Asking) => void;
}): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const set = (change: Partial<Asking>): void => onChange(`asking.${Object.keys(change)[0]}`, { ...value, ...change });
  return (
    <DraftSection title={words.t('notes.windows')} paths={['asking']} isOpen>
      <WindowsFields value={value} onChange={(next) => onChange('asking.windows', next)} />
      <CheckList
        label={words.t('rows.workingDays')}
        path="asking.workingDays"
        options={weekdays.map((day) => ({ value: day, label: words.days([day]) }))}
        value={value.workingDays}
        onChange={(workingDays) => set({ workingDays })}
      />
      <HolidayFields value={value.holidays} onChange={(holidays) => set({ holidays })} />
      <div className="fields two">
        <WhenField
          type="time"
          label={words.t('rows.cutoff')}
          path="asking.cutoff"
          value={value.cutoff}
          onChange={(cutoff) => set({ cutoff })}
        />
        {numbers.map((name) => (
          <NumberField
            key={name}
            label={t(`draft.${name}`)}
            path={`asking.${name}`}
            value={value[name]}
            onChange={(next) => set({ [name]: next })}
          />
        ))}
      </div>
      <CheckList
        label={words.t('rows.whoMayRequest')}
        path="asking.whoMayRequest"
        options={(['superintendent', 'plumber'] as const).map((role) => ({
          value: role,
          label: words.t(`roles.${role}`),
        }))}
        value={value.whoMayRequest}
        onChange={(whoMayRequest) => set({ whoMayRequest })}
      />
      <Choice
        label={words.t('rows.booking')}
        isLabelShown
        stacked
        options={(['self', 'desk'] as const).map((each) => ({ value: each, label: words.t(`says.booking.${each}`) }))}
        value={value.booking}
        onChange={(booking) => set({ booking })}
      />
      <CheckField
        label={t('form.permitNeeded')}
        value={value.isPermitNeeded}
        onChange={(isPermitNeeded) => set({ isPermitNeeded })}
      />
      <CheckList
        label={t('form.reinspectionWindows')}
        path="asking.reinspectionWindows"
        options={value.windows.map(({ label }) => ({ value: label, label }))}
        value={value.reinspectionWindows ?? []}
        whenNone={words.t('says.allWindows')}
        onChange={(labels) => set({ reinspectionWindows: labels.length === 0 ? null : labels })}
      />
    </DraftSection>
  );
}
