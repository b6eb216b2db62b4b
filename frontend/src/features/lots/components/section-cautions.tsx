import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { DwvPlan } from '@holdwater/shared-types/hydraulics/dwv-plan.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Caution } from '../../../components/caution';
import { Numeral } from '../../../components/numeral';
import { measureWords } from '../../../lib/units';
import { heaviestPlug } from '../dwv-ways';
import { markedPressure } from '../reading-words';

export interface SectionCautionsProps {
  /** The test that stands; null for none. */
  hold: Hold | null;
  plan: DwvPlan | null;
  system: System;
}

/** The forces in a test are told to ten pounds: the plug's own size is no finer. */
const forceStepLbf = 10;

/** What may hurt in the test that stands, and who decides. Over the lowest-rated part stands alone. */
export function SectionCautions({ hold, plan, system }: SectionCautionsProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const { units } = useMe();
  const last = hold?.readings.filter(({ isStruck }) => !isStruck).sort((a, b) => b.at.localeCompare(a.at))[0];
  const ceilingPsi = hold?.ceilingPsi ?? null;
  const isOver =
    ceilingPsi !== null && last?.pressurePsi != null && last.gaugeValve !== 'shut' && last.pressurePsi > ceilingPsi;
  if (isOver) {
    const limit = measureWords(markedPressure(ceilingPsi, hold?.gauge?.incrementPsi, units));
    return <Caution isOver>{t('cautions.over', { limit })}</Caution>;
  }
  const plug = heaviestPlug(plan);
  const bare = plan?.cautions.find(({ code }) => code === 'floors-not-under-test')?.params['floors'];
  const isDwvWater = hold !== null && system === 'dwv' && hold.medium === 'water';
  return (
    <div className="section-cautions">
      {hold !== null && hold.medium !== 'water' ? <Caution>{t('cautions.air')}</Caution> : null}
      {last?.gaugeValve === 'shut' ? <Caution>{t('cautions.shut')}</Caution> : null}
      {hold !== null && !isDwvWater ? <Caution>{t('cautions.pressure')}</Caution> : null}
      {isDwvWater ? (
        <Caution>
          {plug === null ? null : (
            <>
              <Numeral
                text={t('cautions.plugLoad', { pounds: Math.ceil(plug.forceLbf / forceStepLbf) * forceStepLbf })}
              />{' '}
            </>
          )}
          {t('cautions.plug')}
        </Caution>
      ) : null}
      {Array.isArray(bare) && bare.length > 0 ? (
        <Caution>{t('cautions.bare', { floors: bare.join(', ') })}</Caution>
      ) : null}
      <Caution>{t('common.localCode')}</Caution>
    </div>
  );
}
