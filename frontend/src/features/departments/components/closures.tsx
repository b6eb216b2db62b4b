import type { Closure } from '@holdwater/shared-types/departments/departments.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Numeral } from '../../../components/numeral';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { useTimeWords } from '../../../lib/time';
import { useRemoveClosure } from '../api/closures';
import { useRuleCardWords } from '../rule-card-words';

export interface ClosuresProps {
  departmentId: string;
  closures: readonly Closure[];
  /** Earlier ones are not listed. */
  today: string;
  canClose: boolean;
}

/** The days a department is closed, from today on. */
export function Closures({ departmentId, closures, today, canClose }: ClosuresProps): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const words = useTimeWords();
  const { span } = useRuleCardWords();
  const [asked, setAsked] = useState<Closure | null>(null);
  const removing = useRemoveClosure(departmentId);
  const refusal = useErrorWords(removing.error);
  const coming = closures.filter(({ date }) => date >= today).sort((a, b) => a.date.localeCompare(b.date));
  const remove = (closure: Closure): void =>
    removing.mutate(closure.id, {
      onSuccess: () => {
        setAsked(null);
        sayDone({ mark: 'sent', title: t('closures.removed', { date: words.date(closure.date) }) });
      },
    });
  if (coming.length === 0) return <p className="mid">{t('closures.none')}</p>;
  return (
    <>
      <ul className="ruled-list">
        {coming.map((closure) => (
          <li key={closure.id} className="spread">
            <span>
              <span className="b">
                <Numeral text={words.dateYear(closure.date)} />
              </span>{' '}
              {closure.from !== null && closure.to !== null ? (
                <Numeral text={span(closure.from, closure.to)} />
              ) : (
                <span className="mid">{t('closures.allDay')}</span>
              )}
              <span className="s mid row">{closure.why}</span>
            </span>
            {canClose ? (
              <Act
                kind="text"
                size="sm"
                aria-label={t('closures.openNamed', { date: words.date(closure.date) })}
                onClick={() => setAsked(closure)}
              >
                {t('closures.open')}
              </Act>
            ) : null}
          </li>
        ))}
      </ul>
      <Question
        isOpen={asked !== null}
        title={t('closures.openQuestion', { date: asked === null ? '' : words.dateYear(asked.date) })}
        keepWord={t('closures.keepClosed')}
        endWord={t('closures.open')}
        endKind="first"
        onKeep={() => {
          removing.reset();
          setAsked(null);
        }}
        onEnd={() => (asked === null ? undefined : remove(asked))}
        busy={removing.isPending}
        error={refusal ? `${refusal.title}. ${refusal.safe} ${refusal.next}` : undefined}
      >
        {t('closures.openTold')}
      </Question>
    </>
  );
}
