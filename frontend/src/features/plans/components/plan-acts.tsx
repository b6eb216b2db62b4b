import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import type { PlanWords } from '../plan-words';
import { wayKey, type ShownPlan } from '../shown-plan';
import type { PlanChoice } from '../use-plan-choice';

export interface PlanActsProps {
  lot: LotDetail;
  shown: ShownPlan | null;
  choice: PlanChoice;
  words: PlanWords;
  onPrint: () => void;
}

/** The foot of the plan: who decides, and the one act that comes next. */
export function PlanActs({ lot, shown, choice, words, onPrint }: PlanActsProps): ReactNode {
  const { t } = useTranslation(['plans', 'common']);
  const isChosen = shown !== null && shown.chosen !== null;
  return (
    <div className="plan-foot">
      <p className="b">{t('common.localCode')}</p>
      <div className="acts">
        {isChosen ? (
          <Act icon="print" onClick={onPrint}>
            {t('ways.print')}
          </Act>
        ) : null}
        {lot.abilities.canTest ? <MainAct {...{ lot, shown, choice, words }} /> : null}
        {lot.abilities.canTest ? null : <span className="s mid">{t('ways.onlyPlumber')}</span>}
      </div>
    </div>
  );
}

function MainAct({ lot, shown, choice, words }: Omit<PlanActsProps, 'onPrint'>): ReactNode {
  const { t } = useTranslation('plans');
  if (shown === null) return null;
  if (shown.chosen !== null) {
    return shown.chosen.stale.length > 0 ? null : (
      <Act kind="first" to={`/lots/${lot.id}/test`}>
        {t('ways.putUp')}
      </Act>
    );
  }
  const { way } = shown;
  const [why] = words.whyNot(way);
  const [fault] = Object.keys(choice.faults);
  const isAgain = choice.isCurrentWay(wayKey(way));
  return (
    <Act
      kind="first"
      busy={choice.choosing.isPending}
      cannotYet={way.isOffered ? (fault === undefined ? undefined : t(`tools.${fault}`)) : why}
      onClick={() => choice.choose(way)}
    >
      {t(isAgain ? 'ways.again' : 'ways.choose')}
    </Act>
  );
}
