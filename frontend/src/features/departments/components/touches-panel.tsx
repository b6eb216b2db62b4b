import type { RuleCard, RuleCardTouches } from '@holdwater/shared-types/departments/departments.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Icon } from '../../../components/icon';
import { Panel } from '../../../components/panel';
import { QueryState } from '../../../lib/query-state';
import { ruleCardTouchesQuery } from '../api/rule-card-touches';
import { useRuleCardWords } from '../rule-card-words';

/** What happens when a draft is in force: which visits keep theirs, which lots are planned on it, which plans it does not take. */
export function TouchesPanel({ ruleCard }: { ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation('departments');
  const touches = useQuery(ruleCardTouchesQuery(ruleCard.id));
  return (
    <Panel title={t('touches.title', { version: ruleCard.version })} isFlush>
      <QueryState query={touches}>{(found) => <Touches touches={found} ruleCard={ruleCard} />}</QueryState>
    </Panel>
  );
}

function Touches({ touches, ruleCard }: { touches: RuleCardTouches; ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation('departments');
  const { keptVisits, lotsWithoutVisit, unfitPlans } = touches;
  const { version } = ruleCard;
  const versions = keptVisits.versions.join(', ');
  const count = keptVisits.booked + keptVisits.requested;
  return (
    <ul className="ruled-list touches">
      <li>{count === 0 ? t('touches.noVisits') : t('touches.kept', { count, versions })}</li>
      <li>{t('touches.lots', { count: lotsWithoutVisit, version })}</li>
      {unfitPlans.length > 0 ? (
        <li className="touch-warned">
          <Icon name="caution" size={18} />
          <div>
            {t('touches.unfit', { count: unfitPlans.length, version })}
            <details>
              <summary>{t('touches.showLots')}</summary>
              <UnfitPlans plans={unfitPlans} ruleCard={ruleCard} />
            </details>
          </div>
        </li>
      ) : null}
    </ul>
  );
}

function UnfitPlans({ plans, ruleCard }: { plans: RuleCardTouches['unfitPlans']; ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const words = useRuleCardWords();
  const stageName = (code: string): string => {
    const stage = ruleCard.content.stages.find((each) => each.code === code);
    return stage === undefined ? code : words.name(stage.name);
  };
  return (
    <ul>
      {plans.map(({ lotId, lotNumber, tractName, stageCode, system, reason }) => (
        <li key={`${lotId} ${stageCode} ${system}`}>
          <Link to={`/lots/${lotId}`}>
            {[t('common.lot', { number: lotNumber }), tractName].filter(Boolean).join(', ')}
          </Link>
          {': '}
          {t('touches.why', {
            stage: stageName(stageCode),
            system: words.t(`says.systems.${system}`),
            reason: t(`touches.reasons.${reason}`),
          })}
        </li>
      ))}
    </ul>
  );
}
