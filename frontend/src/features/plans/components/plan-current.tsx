import type { TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { useWayName } from '../way-name';

export interface PlanCurrentProps {
  current: TestPlan | null;
  zone: string;
  canChoose: boolean;
  /** Why it cannot be worked out anew: it would no longer be offered. */
  cannotAnew: string | undefined;
  isBusy: boolean;
  onAnew: () => void;
}

/** What is chosen, by whom, and what has changed since. */
export function PlanCurrent({ current, zone, canChoose, cannotAnew, isBusy, onAnew }: PlanCurrentProps): ReactNode {
  const { t } = useTranslation(['plans', 'common']);
  const words = useTimeWords();
  const nameOf = useWayName();
  if (current === null) {
    return (
      <div className="plan-current">
        <p className="b">{t('current.none')}</p>
        <p className="s mid">{t('current.noneText')}</p>
      </div>
    );
  }
  const isStale = current.stale.length > 0;
  const ruleCard = t('common.ruleCard', { version: current.ruleCard.version });
  const time = words.dayClock(current.chosenAt, zone);
  return (
    <div className={`plan-current ${isStale ? 'wash-brass' : 'wash-water'}`}>
      <div className="row">
        {isStale ? <Mark name="waits-on-you" size={24} title={t('slot.stale')} /> : <Mark name="level" size={24} />}
        <div>
          <p className="b">{t('current.chosen', { way: nameOf(current) })}</p>
          <p className="s mid">
            <Numeral text={t('current.by', { name: current.chosenBy, time, ruleCard })} />
          </p>
        </div>
      </div>
      {isStale ? (
        <div role="status">
          <p className="t-brass b">
            {current.stale.map((why) => t(`current.${why}`)).join(' ')} {t('current.stale')}
          </p>
          {canChoose ? (
            <Act
              kind="first"
              onClick={onAnew}
              busy={isBusy}
              cannotYet={cannotAnew === undefined ? undefined : t('current.anewCannot', { why: cannotAnew })}
            >
              {t('current.anew')}
            </Act>
          ) : null}
        </div>
      ) : null}
    </div>
  );
}
