import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Head, PhoneHead } from '../../../components/head';
import { Numeral } from '../../../components/numeral';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { useTimeWords } from '../../../lib/time';
import { VersionState } from './version-list';

export interface RuleCardHeadProps {
  ruleCard: RuleCard;
  stageName: string;
  /** Against which version how many rows of this stage differ. */
  changes: { version: number; changed: number; all: number } | null;
  /** The choice of the stage. */
  acts: ReactNode;
}

/** What is read: department, version, its state and days; on a phone in a few lines. */
export function RuleCardHead({ ruleCard, stageName, changes, acts }: RuleCardHeadProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useTimeWords();
  const isPhone = useSheetWidth() === 'phone';
  const { effectiveFrom, zone } = ruleCard;
  const title = t('sheet.title', { department: ruleCard.departmentName, version: ruleCard.version });
  const label = t('sheet.label', { stage: stageName });
  const state = <VersionState card={ruleCard} />;
  if (isPhone) {
    return (
      <>
        <PhoneHead backTo="/rule-cards" label={label} title={title} right={state} />
        <div className="panel-body">
          {acts}
          <p className="s mid phone-facts">
            {effectiveFrom === null
              ? t('versions.noDate')
              : t(ruleCard.isInForce ? 'versions.since' : 'versions.from', { date: words.dateYear(effectiveFrom) })}
            . {words.zone(zone)}
          </p>
        </div>
      </>
    );
  }
  const from = effectiveFrom === null ? t('versions.noDate') : <Numeral text={words.dateYear(effectiveFrom)} />;
  const changed =
    changes === null
      ? []
      : [
          {
            label: t('sheet.changed', { version: changes.version }),
            value: t('sheet.changes', { count: changes.changed, all: changes.all }),
          },
        ];
  return (
    <Head
      label={label}
      title={title}
      cells={[
        { label: t('sheet.state'), value: state },
        { label: t('sheet.from'), value: from },
        { label: t('sheet.zone'), value: words.zone(zone) },
        ...changed,
      ]}
      acts={acts}
    />
  );
}
