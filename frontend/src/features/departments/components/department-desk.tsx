import { useQuery } from '@tanstack/react-query';
import { type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Panel } from '../../../components/panel';
import { useNow } from '../../../lib/clock';
import { localDateOf } from '../../../lib/local-days';
import { Failed, QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { departmentQuery } from '../api/department';
import { useDraftRuleCard } from '../api/draft-rule-card';
import { ruleCardQuery } from '../api/rule-card';
import { ClosureForm } from './closure-form';
import { Closures } from './closures';
import { DraftForm } from './draft-form';
import { PublishForm } from './publish-form';
import { VersionList } from './version-list';

export interface DepartmentDeskProps {
  departmentId: string;
  ruleCardId: string | null;
  /** The versions stand at the left, the acts at the right. */
  part: 'versions' | 'acts';
}

/** What signed-in readers see of a department besides its rule card; acts by what the server lets this reader do. */
export function DepartmentDesk({ departmentId, ruleCardId, part }: DepartmentDeskProps): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const words = useTimeWords();
  const now = useNow();
  const department = useQuery(departmentQuery(departmentId));
  return (
    <QueryState query={department}>
      {({ department: one, ruleCards, closures, abilities }) => {
        const today = localDateOf(now, one.zone);
        if (part === 'versions') {
          return (
            <>
              <div className="list-head">
                <h2 className="h2">{one.name}</h2>
                <p className="s mid">
                  {t('list.elevation', { feet: one.elevationFt.toLocaleString('en-US') })} {words.zone(one.zone)}
                </p>
                {one.phone === null ? null : (
                  <a className="s n" href={`tel:${one.phone}`}>
                    {one.phone}
                  </a>
                )}
              </div>
              <VersionList ruleCards={ruleCards} chosenId={ruleCardId} />
            </>
          );
        }
        const draft = ruleCards.find(({ state }) => state === 'draft');
        return (
          <>
            {abilities.canEditRuleCards ? (
              <DraftPart
                departmentId={departmentId}
                draftId={draft?.id ?? null}
                isShown={draft !== undefined && draft.id === ruleCardId}
              />
            ) : null}
            <Panel title={t('closures.title')}>
              <Closures departmentId={departmentId} closures={closures} today={today} canClose={abilities.canClose} />
            </Panel>
            {abilities.canClose ? (
              <Panel title={t('closures.addTitle')} isQuiet>
                <ClosureForm departmentId={departmentId} today={today} />
              </Panel>
            ) : null}
          </>
        );
      }}
    </QueryState>
  );
}

function DraftPart({
  departmentId,
  draftId,
  isShown,
}: {
  departmentId: string;
  draftId: string | null;
  isShown: boolean;
}): ReactNode {
  const { t } = useTranslation('departments');
  const navigate = useNavigate();
  const drafting = useDraftRuleCard(departmentId);
  const card = useQuery({ ...ruleCardQuery(draftId ?? ''), enabled: draftId !== null && isShown });
  const start = (): void =>
    drafting.mutate(undefined, { onSuccess: (made) => void navigate(`/rule-cards/${made.id}`) });
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
          <Panel title={t('draft.title', { version: ruleCard.version })}>
            <DraftForm key={ruleCard.id} ruleCard={ruleCard} />
          </Panel>
          <Panel title={t('publish.title')}>
            <PublishForm key={ruleCard.id} ruleCard={ruleCard} />
          </Panel>
        </>
      )}
    </QueryState>
  );
}
