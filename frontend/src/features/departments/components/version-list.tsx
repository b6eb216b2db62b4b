import type { Department, RuleCardBrief } from '@holdwater/shared-types/departments/departments.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';

/** The versions of one department's rule card, the newest first. */
export function VersionList({
  ruleCards,
  chosenId,
}: {
  ruleCards: readonly RuleCardBrief[];
  chosenId: string | null;
}): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const words = useTimeWords();
  const sorted = [...ruleCards].sort((a, b) => b.version - a.version);
  const dates = ({ effectiveFrom, effectiveTo, isInForce }: RuleCardBrief): string => {
    if (effectiveFrom === null) return t('versions.noDate');
    if (effectiveTo === null)
      return t(isInForce ? 'versions.since' : 'versions.from', { date: words.dateYear(effectiveFrom) });
    return t('versions.fromTo', { from: words.dateYear(effectiveFrom), to: words.dateYear(effectiveTo) });
  };
  return (
    <ul className="ruled-list links">
      {sorted.map((card) => (
        <li key={card.id}>
          <Link to={`/rule-cards/${card.id}`} aria-current={card.id === chosenId ? 'page' : undefined}>
            <span className="spread">
              <span className="b">{t('versions.name', { version: card.version })}</span>
              <VersionState card={card} />
            </span>
            <span className="s mid">
              <Numeral text={dates(card)} />
            </span>
          </Link>
        </li>
      ))}
    </ul>
  );
}

/** Draft, in force, to come or replaced. */
export function VersionState({ card }: { card: RuleCardBrief }): ReactNode {
  const { t } = useTranslation('departments');
  if (card.state === 'draft') return <span className="t-brass b">{t('versions.draft')}</span>;
  if (card.isInForce) return <span className="t-green b">{t('versions.inForce')}</span>;
  return <span className="mid">{t(card.effectiveTo === null ? 'versions.toCome' : 'versions.replaced')}</span>;
}

/** Every department, with its rule card in a few words. */
export function DepartmentList({
  departments,
  chosenId,
}: {
  departments: readonly Department[];
  chosenId: string | null;
}): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const words = useTimeWords();
  return (
    <ul className="ruled-list links">
      {departments.map((department) => (
        <li key={department.id}>
          <Link
            to={
              department.ruleCard === null
                ? `/rule-cards?department=${department.id}`
                : `/rule-cards/${department.ruleCard.id}`
            }
            aria-current={department.id === chosenId ? 'page' : undefined}
          >
            <span className="b">{department.name}</span>
            <span className="s mid">
              {department.ruleCard === null
                ? t(department.isOutside ? 'list.outside' : 'list.noCard')
                : t('common.ruleCard', { version: department.ruleCard.version })}
              , {words.zone(department.zone)}
            </span>
          </Link>
        </li>
      ))}
    </ul>
  );
}
