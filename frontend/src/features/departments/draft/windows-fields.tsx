import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useRuleCardWords } from '../rule-card-words';
import type { Asking } from './asking-section';
import { CheckList, PartFault } from './check-fields';
import { ListFields } from './list-fields';
import { NumberField, TextField, WhenField } from './text-fields';

const weekdays = [1, 2, 3, 4, 5, 6, 7] as const;
const fresh = (): Asking['windows'][number] => ({ label: '', start: '08:00', end: '10:00', days: [], room: 4 });

/** The windows of a day: name, span, weekdays, and how many visits each takes. */
export function WindowsFields({ value, onChange }: { value: Asking; onChange: (value: Asking) => void }): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const at = (index: number, name: string): string => `asking.windows.${index}.${name}`;
  return (
    <>
      <ListFields
        items={value.windows}
        fresh={fresh}
        fewest={1}
        addWord={t('draft.addWindow')}
        nameOf={(index) => t('draft.windowName', { number: index + 1 })}
        onChange={(windows) => onChange(withWindows(value, windows))}
      >
        {(window, index, change) => (
          <>
            <div className="fields two">
              <TextField
                label={t('draft.label')}
                path={at(index, 'label')}
                maxLength={30}
                value={window.label}
                onChange={(label) => change({ ...window, label })}
              />
              <NumberField
                label={t('draft.room')}
                unit={t('draft.visits')}
                path={at(index, 'room')}
                value={window.room}
                onChange={(room) => change({ ...window, room })}
              />
              {(['start', 'end'] as const).map((name) => (
                <WhenField
                  key={name}
                  type="time"
                  label={t(`draft.${name}`)}
                  path={at(index, name)}
                  value={window[name]}
                  onChange={(time) => change({ ...window, [name]: time })}
                />
              ))}
            </div>
            <CheckList
              label={t('form.days')}
              path={at(index, 'days')}
              options={weekdays.map((day) => ({ value: day, label: words.days([day]) }))}
              value={window.days}
              whenNone={words.t('says.everyWorkingDay')}
              onChange={(days) => change({ ...window, days })}
            />
          </>
        )}
      </ListFields>
      <PartFault path="asking.windows" />
    </>
  );
}

/** Re-inspections stay in their window when it is renamed; with a window that goes, they may be in any of the others again. */
function withWindows(asking: Asking, windows: Asking['windows']): Asking {
  if (asking.reinspectionWindows === null) return { ...asking, windows };
  const isRenamed = windows.length === asking.windows.length;
  const labels = asking.reinspectionWindows.flatMap((label) => {
    const index = asking.windows.findIndex((window) => window.label === label);
    const renamed = isRenamed ? windows[index]?.label : windows.find((window) => window.label === label)?.label;
    return renamed === undefined ? [] : [renamed];
  });
  return { ...asking, windows, reinspectionWindows: labels.length === 0 ? null : labels };
}
