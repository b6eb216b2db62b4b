import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import { useLocale } from '../../../lib/i18n';
import type { WindowDraft } from '../draft-values';
import { weekdaysWords } from '../rule-card-words';

const weekdays = [1, 2, 3, 4, 5, 6, 7] as const;

export interface WindowFieldsProps {
  window: WindowDraft;
  index: number;
  faultOf: (name: string) => string | undefined;
  onChange: (window: WindowDraft) => void;
  /** Absent for the last one: a rule card has a window. */
  onRemove?: () => void;
}

/** One window of a day: its name, its span, its weekdays and how many visits it takes. */
export function WindowFields({ window, index, faultOf, onChange, onRemove }: WindowFieldsProps): ReactNode {
  const { t } = useTranslation('departments');
  const locale = useLocale();
  const set = (change: Partial<WindowDraft>): void => onChange({ ...window, ...change });
  const toggle = (day: number): void =>
    set({ days: window.days.includes(day) ? window.days.filter((one) => one !== day) : [...window.days, day].sort() });
  return (
    <fieldset className="window-fields">
      <legend className="h3">{t('draft.windowName', { number: index + 1 })}</legend>
      <div className="window-row">
        <Field
          label={t('draft.label')}
          value={window.label}
          maxLength={30}
          error={faultOf('label')}
          onChange={(event) => set({ label: event.target.value })}
        />
        <Field
          label={t('draft.start')}
          type="time"
          isNumeral
          value={window.start}
          error={faultOf('start')}
          onChange={(event) => set({ start: event.target.value })}
        />
        <Field
          label={t('draft.end')}
          type="time"
          isNumeral
          value={window.end}
          error={faultOf('end')}
          onChange={(event) => set({ end: event.target.value })}
        />
        <Field
          label={t('draft.room')}
          isNumeral
          unit={t('draft.visits')}
          value={window.room}
          error={faultOf('room')}
          onChange={(event) => set({ room: event.target.value })}
        />
      </div>
      <div className="row wrap">
        {weekdays.map((day) => (
          <label key={day} className="check-row">
            <input type="checkbox" checked={window.days.includes(day)} onChange={() => toggle(day)} />
            {weekdaysWords([day], locale)}
          </label>
        ))}
        <span className="s mid">{window.days.length === 0 ? t('says.everyWorkingDay') : null}</span>
      </div>
      {faultOf('days') ? <p className="field-error">{faultOf('days')}</p> : null}
      {onRemove ? (
        <Act kind="text" size="sm" onClick={onRemove}>
          {t('draft.removeWindow', { label: window.label })}
        </Act>
      ) : null}
    </fieldset>
  );
}
