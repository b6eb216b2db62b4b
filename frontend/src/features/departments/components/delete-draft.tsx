import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { useDeleteRuleCardDraft } from '../api/delete-rule-card-draft';

/** Desk: throws the draft away, after one question. */
export function DeleteDraft({ ruleCard: { id, version, departmentId } }: { ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation('departments');
  const navigate = useNavigate();
  const [isAsking, setIsAsking] = useState(false);
  const deleting = useDeleteRuleCardDraft(id);
  const refusal = useErrorWords(deleting.error);
  const remove = (): void =>
    deleting.mutate(undefined, {
      onSuccess: () => {
        sayDone({ mark: 'withdrawn', title: t('deleteDraft.done', { version }) });
        void navigate(`/rule-cards?department=${departmentId}`);
      },
    });
  return (
    <>
      <Act kind="text" size="sm" onClick={() => setIsAsking(true)}>
        {t('deleteDraft.act', { version })}
      </Act>
      <Question
        isOpen={isAsking}
        title={t('deleteDraft.question', { version })}
        keepWord={t('publish.keep')}
        endWord={t('deleteDraft.act', { version })}
        onKeep={() => {
          deleting.reset();
          setIsAsking(false);
        }}
        onEnd={remove}
        busy={deleting.isPending}
        error={refusal ? `${refusal.title}. ${refusal.safe} ${refusal.next}` : undefined}
      >
        {t('deleteDraft.told')}
      </Question>
    </>
  );
}
