import { addClosure } from '@holdwater/shared-types/departments/departments.contract.js';
import { useRef, useState, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { useTimeWords } from '../../../lib/time';
import { useContractForm } from '../../../lib/use-contract-form';
import { useAddClosure } from '../api/closures';

const empty = { date: '', from: '', to: '', why: '' };

/** Desk: closes a day, or a span of it; open visits inside it are freed, so it asks first. */
export function ClosureForm({ departmentId, today }: { departmentId: string; today: string }): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const words = useTimeWords();
  const form = useContractForm(addClosure.body, empty);
  const adding = useAddClosure(departmentId);
  const refusal = useErrorWords(adding.error);
  const [isAsking, setIsAsking] = useState(false);
  const place = useRef<HTMLFormElement>(null);
  const { values, set, faultOf } = form;
  const body = { date: values.date, from: values.from || null, to: values.to || null, why: values.why };
  const ask = (event: FormEvent): void => {
    event.preventDefault();
    if (form.check(body)) return setIsAsking(true);
    requestAnimationFrame(() => place.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());
  };
  const add = (): void =>
    adding.mutate(body, {
      onError: form.takeError,
      onSuccess: () => {
        setIsAsking(false);
        form.reset(empty);
        sayDone({ mark: 'sent', title: t('closures.done', { date: words.date(body.date) }) });
      },
    });
  return (
    <form ref={place} onSubmit={ask} noValidate className="fields">
      <Field
        label={t('closures.date')}
        type="date"
        isNumeral
        min={today}
        value={values.date}
        error={values.date === '' && faultOf('date') ? t('errors.fields.required') : faultOf('date')}
        onChange={(event) => set('date', event.target.value)}
      />
      <div className="fields two">
        {(['from', 'to'] as const).map((name) => (
          <Field
            key={name}
            label={t(`closures.${name}`)}
            type="time"
            isNumeral
            isOptional
            value={values[name]}
            error={faultOf(name)}
            onChange={(event) => set(name, event.target.value)}
          />
        ))}
      </div>
      <Field
        label={t('closures.why')}
        maxLength={120}
        value={values.why}
        error={faultOf('why')}
        onChange={(event) => set('why', event.target.value)}
      />
      <div>
        <Act type="submit">{t('closures.add')}</Act>
      </div>
      <Question
        isOpen={isAsking}
        title={t('closures.question', { date: values.date === '' ? '' : words.dateYear(values.date) })}
        keepWord={t('closures.keep')}
        endWord={t('closures.add')}
        onKeep={() => setIsAsking(false)}
        onEnd={add}
        busy={adding.isPending}
        error={refusal ? `${refusal.title}. ${refusal.safe} ${refusal.next}` : undefined}
      >
        {t('closures.told')}
      </Question>
    </form>
  );
}
