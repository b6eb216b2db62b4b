import type { Medium, System } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Caution } from '../../../components/caution';
import type { Instrument } from '../typed-reading';

export interface TestCautionsProps {
  system: System;
  medium: Medium | null;
  instrument: Instrument;
  isValveShut: boolean;
  isOverLimit: boolean;
}

/** What can hurt somebody about what is shown; over the lowest-rated part nothing else is said. */
export function TestCautions({ system, medium, instrument, isValveShut, isOverLimit }: TestCautionsProps): ReactNode {
  const { t } = useTranslation(['holds', 'common']);
  const { ceilingPsi, minimumPsi, isLevel } = instrument;
  if (isOverLimit) return <Caution isOver>{t('cautions.over', { psi: ceilingPsi ?? 0 })}</Caution>;
  const hasAir = medium === 'air' || medium === 'water-topped-with-air';
  const never = ceilingPsi === null ? '' : t('cautions.never', { psi: ceilingPsi });
  return (
    <div className="cautions">
      {isValveShut ? <Caution>{t('cautions.shut')}</Caution> : null}
      {hasAir ? (
        <Caution>
          {t('cautions.air')} {never}
        </Caution>
      ) : null}
      {isLevel || minimumPsi === null ? null : (
        <Caution>
          {t('cautions.pressure')} {hasAir ? '' : never}
        </Caution>
      )}
      {system === 'dwv' ? <Caution>{t('cautions.plug')}</Caution> : null}
      <p className="s mid">{t('common.localCode')}</p>
    </div>
  );
}
