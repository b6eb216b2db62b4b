import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { asking } from '@holdwater/shared-types/departments/rule-card.content.js';
import { useRef, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { useEditRuleCard } from '../api/edit-rule-card';
import { contentOf, draftOf, type WindowDraft } from '../draft-values';
import { withoutPrefix } from '../without-prefix';
import { WindowFields } from './window-fields';

const newWindow: WindowDraft = { label: '', start: '08:00', end: '10:00', days: [], room: '4' };
const numbers = ['workingDaysAhead', 'horizonWorkingDays', 'lotsPerRequest'] as const;

/** Desk: windows and requests of a draft. What is not asked here stays as in the version before. */
export function DraftForm({ ruleCard }: { ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const form = useContractForm(asking, draftOf(ruleCard.content));
  const editing = useEditRuleCard(ruleCard.id);
  const place = useRef<HTMLFormElement>(null);
  const { values, set, faultOf } = form;
  const focusFault = (): void =>
    void requestAnimationFrame(() => place.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const content = contentOf(ruleCard.content, values);
    if (!form.check(content.asking)) return focusFault();
    editing.mutate(content, {
      onError: (error) => {
        form.takeError(withoutPrefix(error, 'content.asking.'));
        focusFault();
      },
      onSuccess: () => sayDone({ mark: 'sent', title: t('draft.saved', { version: ruleCard.version }) }),
    });
  };
  const change = (index: number, window: WindowDraft): void => set('windows', values.windows.with(index, window));
  return (
    <form ref={place} onSubmit={submit} noValidate className="fields">
      {values.windows.map((window, index) => (
        <WindowFields
          key={index}
          window={window}
          index={index}
          faultOf={(name) => faultOf(`windows.${index}.${name}`)}
          onChange={(changed) => change(index, changed)}
          onRemove={
            values.windows.length > 1
              ? () =>
                  set(
                    'windows',
                    values.windows.filter((_, at) => at !== index),
                  )
              : undefined
          }
        />
      ))}
      <div>
        <Act size="sm" icon="plus" onClick={() => set('windows', [...values.windows, newWindow])}>
          {t('draft.addWindow')}
        </Act>
      </div>
      <div className="fields two">
        <Field
          label={t('rows.cutoff')}
          type="time"
          isNumeral
          value={values.cutoff}
          error={faultOf('cutoff')}
          onChange={(event) => set('cutoff', event.target.value)}
        />
        {numbers.map((name) => (
          <Field
            key={name}
            label={t(`draft.${name}`)}
            isNumeral
            inputMode="numeric"
            value={values[name]}
            error={faultOf(name)}
            onChange={(event) => set(name, event.target.value)}
          />
        ))}
      </div>
      <Choice
        label={t('rows.booking')}
        isLabelShown
        stacked
        options={(['self', 'desk'] as const).map((value) => ({ value, label: t(`says.booking.${value}`) }))}
        value={values.booking}
        onChange={(booking) => set('booking', booking)}
      />
      {editing.error !== null ? <Failed error={editing.error} level={3} /> : null}
      <div>
        <Act type="submit" busy={editing.isPending}>
          {t('draft.save', { version: ruleCard.version })}
        </Act>
      </div>
    </form>
  );
}
