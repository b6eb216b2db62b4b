import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import { useTranslation } from 'react-i18next';

/** "rule card 6: at least 100 psi": what the rule card asks of a system, for the test that stands. */
export function useAsksWords(ruleCard: RuleCard, stageCode: string): (system: System, hold: Hold | null) => string {
  const { t } = useTranslation(['outcomes', 'common']);
  return (system, hold) => {
    const rule = ruleCard.content.tests.find((one) => one.stageCode === stageCode && one.system === system);
    const card = t('common.ruleCard', { version: ruleCard.version });
    const pressure = hold?.minimumPsi ?? rule?.pressures.find(({ medium }) => medium === hold?.medium)?.minimumPsi;
    if (pressure !== undefined) return t('asks.pressure', { card, psi: pressure });
    const [first] = rule?.pressures ?? [];
    if (system === 'water' && first) return t('asks.pressure', { card, psi: first.minimumPsi });
    const head = rule?.headRule ?? null;
    if (head?.kind === 'above-highest-fitting') return t('asks.head', { card, feet: head.feet ?? 0 });
    return hold === null ? card : t(`asks.${hold.method}`, { card });
  };
}
