import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { useMe } from '../../../app/session';
import { Icon } from '../../../components/icon';
import { Numeral } from '../../../components/numeral';
import { drawHouse } from '../../../drawings/cutaway-house';
import { height, measureWords, workedPressure } from '../../../lib/units';
import { drawnHouseOf, dwvWays, type DwvWay } from '../dwv-ways';

/** No gauge hangs at a plug: to a tenth, as the feet beside it. */
const plugMarkPsi = 0.1;

export interface WaysToTestProps {
  house: HouseGeometry;
  rule: TestRule;
  chosen: DwvMethod | null;
  /** Tested before the slab is poured. */
  isGroundwork: boolean;
  ruleCard: LotDetail['ruleCard'];
}

/** The methods the rule card accepts, worked out for this very house, and why one does not serve here. */
export function WaysToTest({ house, rule, chosen, isGroundwork, ruleCard }: WaysToTestProps): ReactNode {
  const { t } = useTranslation(['lots', 'departments', 'common']);
  const say = useWayWords(house, chosen, isGroundwork);
  return (
    <div className="ways">
      <div className="spread ways-head">
        <h3 className="h3">{t('ways.title')}</h3>
        {ruleCard === null ? null : (
          <Link className="s" to={`/rule-cards/${ruleCard.id}#note-2`}>
            {t('ways.note', { ruleCard: t('common.ruleCard', { version: ruleCard.version }) })}
          </Link>
        )}
      </div>
      <ul>
        {dwvWays(house, rule, isGroundwork).map((way) => {
          const isUsable = way.isAccepted && (isGroundwork || way.plan?.usable === true);
          const isRefused = !way.isAccepted || way.plan?.usable === false;
          return (
            <li key={way.method} className="spread">
              <span className="row">
                {isUsable ? <Icon name="check" size={16} className="t-green" title={t('ways.works')} /> : null}
                {isRefused ? <Icon name="close" size={16} className="t-red" title={t('ways.doesNot')} /> : null}
                {!isUsable && !isRefused ? <span className="mk16 mk" /> : null}
                <span className={way.method === chosen ? 'b' : 'med'}>{t(`departments.methods.${way.method}`)}</span>
              </span>
              <span className="s mid">
                <Numeral text={say(way)} />
              </span>
            </li>
          );
        })}
      </ul>
    </div>
  );
}

function useWayWords(house: HouseGeometry, chosen: DwvMethod | null, isGroundwork: boolean): (way: DwvWay) => string {
  const { t } = useTranslation('lots');
  const { units } = useMe();
  const datumFt = drawHouse(drawnHouseOf(house)).datumFt;
  return ({ method, isAccepted, plan }) => {
    if (!isAccepted) return t('ways.notAccepted');
    if (isGroundwork) return t(method === chosen ? 'ways.chosenPlain' : 'ways.accepted');
    if (plan === null) return t('ways.notKnown');
    const [reason] = plan.reasons;
    if (reason !== undefined) {
      return t(`reasons.${reason.code}`, {
        short: plan.shortByFt === null ? '' : measureWords(height(plan.shortByFt, units)),
      });
    }
    if (plan.fillLevelFt === null) return t(method === chosen ? 'ways.chosenPlain' : 'ways.accepted');
    const level = measureWords(height(plan.fillLevelFt - datumFt, units));
    const atPlug = [...plan.plugs].sort((a, b) => b.pressurePsi - a.pressurePsi)[0];
    const words =
      atPlug === undefined
        ? level
        : t('ways.levelAtPlug', {
            level,
            pressure: measureWords(workedPressure(atPlug.pressurePsi, plugMarkPsi, units)),
          });
    return method === chosen ? t('ways.chosen', { words }) : words;
  };
}
