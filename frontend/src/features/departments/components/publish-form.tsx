import { localDate } from '@holdwater/shared-types/common/fields.js';
import { ruleCardFaults } from '@holdwater/shared-types/departments/rule-card-faults.js';
import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { useState, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Question } from '../../../components/question';
import { isApiError } from '../../../lib/api-error';
import { useNow } from '../../../lib/clock';
import { useErrorWords, useFieldWords } from '../../../lib/errors';
import { addDays, localDateOf } from '../../../lib/local-days';
import { useTimeWords } from '../../../lib/time';
import { PublishTold } from './publish-told';
import { usePublishRuleCard } from '../api/publish-rule-card';

/** Desk: puts a draft in force from a day on, after one question. */
export function PublishForm({ ruleCard }: { ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const { version } = ruleCard;
  const words = useTimeWords();
  const fieldWords = useFieldWords();
  const today = localDateOf(useNow(), ruleCard.zone);
  const [from, setFrom] = useState(addDays(today, 1));
  const [isAsking, setIsAsking] = useState(false);
  const publishing = usePublishRuleCard(ruleCard.id);
  const refusal = useErrorWords(publishing.error);
  const faults = Object.keys(ruleCardFaults(ruleCard.content));
  const isDate = localDate.safeParse(from).success;
  const named = isApiError(publishing.error) ? publishing.error.fields['effectiveFrom'] : undefined;
  const ask = (event: FormEvent): void => {
    event.preventDefault();
    if (isDate && faults.length === 0) setIsAsking(true);
  };
  const publish = (): void =>
    publishing.mutate(from, {
      onSuccess: () => {
        setIsAsking(false);
        sayDone({ mark: 'sent', title: t('publish.done', { version, date: words.date(from) }) });
      },
    });
  return (
    <form onSubmit={ask} noValidate className="fields">
      <Field
        label={t('publish.from')}
        type="date"
        isNumeral
        min={today}
        value={from}
        error={isDate ? fieldWords(named) : fieldWords('required')}
        onChange={(event) => {
          publishing.reset();
          setFrom(event.target.value);
        }}
      />
      <Act
        kind="first"
        size="lg"
        type="submit"
        wide
        cannotYet={faults.length > 0 ? t('publish.faults', { count: faults.length }) : undefined}
      >
        {t('publish.act', { version })}
      </Act>
      {faults.length > 0 ? <Link to={`/rule-cards/${ruleCard.id}?mode=change`}>{t('publish.showFaults')}</Link> : null}
      <p className="s mid">{t('publish.never', { next: version + 1 })}</p>
      <Question
        isOpen={isAsking}
        title={t('publish.question', { version, date: isDate ? words.dateYear(from) : from })}
        keepWord={t('publish.keep')}
        endWord={t('publish.act', { version })}
        onKeep={() => setIsAsking(false)}
        onEnd={publish}
        busy={publishing.isPending}
        error={refusal ? `${refusal.title}. ${refusal.safe} ${refusal.next}` : undefined}
      >
        <PublishTold ruleCardId={ruleCard.id} />
      </Question>
    </form>
  );
}
