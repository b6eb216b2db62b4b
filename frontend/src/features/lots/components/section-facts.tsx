import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { DwvPlan } from '@holdwater/shared-types/hydraulics/dwv-plan.contract.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Cell, Cells } from '../../../components/cells';
import { Measure } from '../../../components/numeral';
import { drawHouse } from '../../../drawings/cutaway-house';
import { height } from '../../../lib/units';
import { drawnHouseOf } from '../dwv-ways';
import { markedPressure } from '../reading-words';

export interface SectionFactsProps {
  house: HouseGeometry | null;
  /** The test that stands; null for none. */
  hold: Hold | null;
  rule: TestRule | null;
  plan: DwvPlan | null;
  system: System;
}

/** What the standing test is, in ruled cells; without one, what the rule card asks. */
export function SectionFacts(props: SectionFactsProps): ReactNode {
  return props.system === 'dwv' ? <DwvFacts {...props} /> : <WaterFacts {...props} />;
}

function DwvFacts({ house, hold, rule, plan }: SectionFactsProps): ReactNode {
  const { t } = useTranslation(['lots', 'departments', 'common']);
  const { units } = useMe();
  const datumFt = house === null ? 0 : drawHouse(drawnHouseOf(house)).datumFt;
  const level = hold?.fillLevelFt ?? null;
  const filled = level === null ? null : height(level - datumFt, units);
  return (
    <Cells columns={4}>
      <Cell label={t('section.method')}>
        {hold === null ? t('section.notChosen') : t(`departments.methods.${hold.method}`)}
      </Cell>
      <Cell label={t('section.fillTo')}>
        {filled === null ? t('common.none') : <Measure value={filled.number} unit={filled.unit} />}
      </Cell>
      <Cell label={t('section.waterNeeded')}>
        {plan?.volumeGal ? (
          <>
            {t('common.about')} <Measure value={Math.round(plan.volumeGal)} unit={t('section.gal')} />
          </>
        ) : (
          t('section.notKnown')
        )}
      </Cell>
      <StandCell rule={rule} />
    </Cells>
  );
}

function WaterFacts({ hold, rule }: SectionFactsProps): ReactNode {
  const { t } = useTranslation(['lots', 'departments', 'common']);
  const { units } = useMe();
  const asked = rule?.pressures.find(({ medium }) => medium === (hold?.medium ?? 'water'));
  const minimumPsi = hold?.minimumPsi ?? asked?.minimumPsi ?? null;
  const psi = (value: number | null): ReactNode => {
    if (value === null) return t('common.none');
    const measure = markedPressure(value, hold?.gauge?.incrementPsi, units);
    return <Measure value={measure.number} unit={measure.unit} />;
  };
  return (
    <Cells columns={4}>
      <Cell label={t('section.medium')}>
        {hold === null ? t('section.notChosen') : t(`departments.media.${hold.medium}`)}
      </Cell>
      <Cell label={t('section.minimum')}>{psi(minimumPsi)}</Cell>
      <Cell label={t('section.ceiling')}>{hold === null ? t('section.notKnown') : psi(hold.ceilingPsi)}</Cell>
      <StandCell rule={rule} />
    </Cells>
  );
}

function StandCell({ rule }: { rule: TestRule | null }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const minutes = rule?.standMinutes ?? null;
  if (rule === null) return <Cell label={t('section.stand')}>{t('section.notKnown')}</Cell>;
  return (
    <Cell label={t('section.stand')}>
      {minutes === null ? t('section.untilSeen') : <Measure value={minutes} unit="min" />}
    </Cell>
  );
}
