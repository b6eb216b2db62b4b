import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Panel } from '../../../components/panel';
import { Failed, QueryState } from '../../../lib/query-state';
import { useDraftRuleCard } from '../api/draft-rule-card';
import { ruleCardQuery } from '../api/rule-card';
import { DeleteDraft } from './delete-draft';
import { PublishForm } from './publish-form';
import { TouchesPanel } from './touches-panel';

export interface DraftPartProps {
  departmentId: string;
  draftId: string | null;
  /** Whether the draft is what the sheet shows. */
  isShown: boolean;
}

/** Desk: begins a draft, or goes to the one there is; beside the draft, what it touches and its publishing. */
export function DraftPart({ departmentId, draftId, isShown }: DraftPartProps): ReactNode {
  const { t } = useTranslation('departments');
  const navigate = useNavigate();
  const drafting = useDraftRuleCard(departmentId);
  const card = useQuery({ ...ruleCardQuery(draftId ?? ''), enabled: draftId !== null && isShown });
  const start = (): void =>
    drafting.mutate(undefined, { onSuccess: (made) => void navigate(`/rule-cards/${made.id}?mode=change`) });
  if (draftId === null) {
    return (
      <Panel title={t('draft.none')}>
        <p className="mid panel-words">{t('draft.noneText')}</p>
        {drafting.error !== null ? <Failed error={drafting.error} level={3} /> : null}
        <Act kind="first" busy={drafting.isPending} onClick={start}>
          {t('draft.new')}
        </Act>
      </Panel>
    );
  }
  if (!isShown) {
    return (
      <Panel title={t('draft.stands')}>
        <Act to={`/rule-cards/${draftId}`}>{t('draft.openIt')}</Act>
      </Panel>
    );
  }
  return (
    <QueryState query={card}>
      {(ruleCard) => (
        <>
          <TouchesPanel ruleCard={ruleCard} />
          <Panel title={t('publish.title')}>
            <PublishForm key={ruleCard.id} ruleCard={ruleCard} />
            <DeleteDraft ruleCard={ruleCard} />
          </Panel>
        </>
      )}
    </QueryState>
  );
}
