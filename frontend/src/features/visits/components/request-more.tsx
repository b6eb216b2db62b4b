import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import '../request.css';

/** What a request says besides lots and window. */
export interface RequestWords {
  readonly callerName: string;
  readonly note: string;
  /** Day and clock time on the department's wall clock; both or none. */
  readonly neededDate: string;
  readonly neededTime: string;
}

export const noWords: RequestWords = { callerName: '', note: '', neededDate: '', neededTime: '' };

export interface RequestMoreProps {
  values: RequestWords;
  onChange: (values: RequestWords) => void;
  faultOf: (name: string) => string | undefined;
  /** The desk asks for a caller. */
  hasCaller: boolean;
  zoneWords: string | null;
}

/** The caller the desk asks for, and what may be added: a note, and by when it is needed. */
export function RequestMore({ values, onChange, faultOf, hasCaller, zoneWords }: RequestMoreProps): ReactNode {
  const { t } = useTranslation('visits');
  const set = (part: Partial<RequestWords>): void => onChange({ ...values, ...part });
  const isNeeded = values.neededDate !== '' || values.neededTime !== '';
  return (
    <div className="fields req-more">
      {hasCaller ? (
        <Field
          id="req-caller"
          label={t('req.caller')}
          hint={t('req.callerHint')}
          maxLength={120}
          autoComplete="off"
          value={values.callerName}
          error={faultOf('callerName')}
          onChange={(event) => set({ callerName: event.target.value })}
        />
      ) : null}
      <details open={isNeeded || values.note !== '' ? true : undefined}>
        <summary>{t('req.more')}</summary>
        <div className="fields">
          <Field label={t('req.note')} isOptional error={faultOf('note')}>
            {(control) => (
              <textarea
                {...control}
                rows={2}
                maxLength={1000}
                value={values.note}
                onChange={(event) => set({ note: event.target.value })}
              />
            )}
          </Field>
          <div className="fields two">
            <Field
              type="date"
              label={t('req.neededDate')}
              isOptional
              value={values.neededDate}
              error={faultOf('neededBy')}
              onChange={(event) => set({ neededDate: event.target.value })}
            />
            <Field
              type="time"
              label={t('req.neededTime')}
              isOptional={!isNeeded}
              value={values.neededTime}
              error={faultOf('neededTime')}
              hint={zoneWords ?? undefined}
              onChange={(event) => set({ neededTime: event.target.value })}
            />
          </div>
        </div>
      </details>
    </div>
  );
}
