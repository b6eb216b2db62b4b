import type { PlanWay, TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { dwvMethods } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Icon } from '../../../components/icon';
import { Numeral } from '../../../components/numeral';
import { Cutaway } from '../../../drawings/cutaway';
import { drawHouse } from '../../../drawings/cutaway-house';
import { Dial } from '../../../drawings/dial';
import { height, measureWords, workedPressure } from '../../../lib/units';
import { drawnHouseOf } from '../../lots/dwv-ways';
import { usePlanWords } from '../plan-words';
import { wayKey } from '../shown-plan';
import { useWayName } from '../way-name';

export interface WayCardsProps {
  ways: readonly PlanWay[];
  house: HouseGeometry;
  /** The range of the gauge in hand, for the small dials. */
  rangePsi: number;
  current: TestPlan | null;
  shown: string | null;
  onShow: (key: string) => void;
}

/** Every way side by side, drawn small; of those that do not serve, why. Each can be looked at. */
export function WayCards(props: WayCardsProps): ReactNode {
  const { t } = useTranslation('plans');
  const { ways } = props;
  return (
    <ul className="way-cards" aria-label={t('ways.title')}>
      {ways.map((way) => (
        <li key={wayKey(way)}>
          <WayCard {...props} way={way} />
        </li>
      ))}
    </ul>
  );
}

function WayCard({ way, house, rangePsi, current, shown, onShow }: WayCardsProps & { way: PlanWay }): ReactNode {
  const { t } = useTranslation('plans');
  const drawn = drawnHouseOf(house);
  const words = usePlanWords(drawHouse(drawn).datumFt);
  const nameOf = useWayName();
  const line = useWayLine(house);
  const key = wayKey(way);
  const isShown = key === shown;
  const isCurrent = current !== null && wayKey(current) === key;
  const why = words.whyNot(way);
  return (
    <button
      type="button"
      className={['way-card', isShown ? 'shown' : '', way.isOffered ? '' : 'refused'].filter(Boolean).join(' ')}
      aria-pressed={isShown}
      onClick={() => onShow(key)}
    >
      <span className="way-picture" aria-hidden="true">
        {way.water === null ? (
          <Cutaway
            house={drawn}
            method={dwvMethods.find((method) => method === way.method) ?? null}
            fillLevelFt={way.dwv?.fillLevelFt ?? null}
            view={way.method === 'gauge' ? 'water' : 'dwv'}
            hasLabels={false}
            maxHeight={124}
          />
        ) : (
          <Dial
            max={rangePsi}
            unit="psi"
            value={way.isOffered ? way.water.targetPsi : null}
            minimum={way.water.floorPsi}
            limit={way.water.ceilingPsi}
            size={120}
          />
        )}
      </span>
      <span className="way-words">
        <span className="row">
          <Icon
            name={way.isOffered ? 'check' : 'close'}
            size={16}
            className={way.isOffered ? 't-green' : 't-red'}
            title={t(way.isOffered ? 'ways.serves' : 'ways.refused')}
          />
          <span className="b">{nameOf(way)}</span>
        </span>
        {isCurrent ? <span className="s t-primer b">{t('ways.isChosen')}</span> : null}
        {way.isOffered ? (
          <span className="s mid">
            <Numeral text={line(way)} />
          </span>
        ) : (
          why.map((each) => (
            <span className="s mid" key={each}>
              <Numeral text={each} />
            </span>
          ))
        )}
      </span>
    </button>
  );
}

/** A way in one line: level and pressure at the plug, or what to pump to. */
function useWayLine(house: HouseGeometry): (way: PlanWay) => string {
  const { t } = useTranslation('plans');
  const { units } = useMe();
  const datumFt = drawHouse(drawnHouseOf(house)).datumFt;
  const psi = (value: number, markPsi: number): string => measureWords(workedPressure(value, markPsi, units));
  return ({ dwv, water }) => {
    if (water !== null) return t('ways.pump', { target: psi(water.targetPsi, 1), limit: psi(water.ceilingPsi, 1) });
    if (dwv === null) return '';
    if (dwv.air !== null) return t('ways.air', { pressure: psi(dwv.air.pressurePsi, 0.1) });
    if (dwv.lifts !== null && dwv.lifts.length > 1) return t('ways.lifts', { count: dwv.lifts.length });
    const level = measureWords(height((dwv.fillLevelFt ?? 0) - datumFt, units));
    const atPlug = Math.max(0, ...dwv.plugs.map(({ pressurePsi }) => pressurePsi));
    return dwv.plugs.length === 0
      ? t('ways.levelOnly', { level })
      : t('ways.level', { level, pressure: psi(atPlug, 0.1) });
  };
}
