import type { HouseModelDetail } from '@holdwater/shared-types/lots/house-model.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { Plain } from '../../../components/plain';
import { Cutaway } from '../../../drawings/cutaway';
import { useTimeWords } from '../../../lib/time';
import { drawnHouseOf } from '../dwv-ways';
import { HouseHead } from './house-head';
import { HouseModelName } from './house-model-name';
import { HouseUnits } from './house-units';

const ownZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** A house model as its builder's people see it. */
export function HouseModelSheet({ model }: { model: HouseModelDetail }): ReactNode {
  const { t } = useTranslation(['houses', 'lots']);
  const { units } = useMe();
  const path = `/lots/houses/${model.id}`;
  const { canWrite, canApply } = model.abilities;
  return (
    <>
      <HouseHead
        title={model.name}
        backTo="/lots/houses"
        cells={[
          { label: t('columns.version'), value: <span className="n">{model.version}</span> },
          { label: t('columns.lots'), value: <span className="n">{model.use.lots}</span> },
        ]}
        acts={
          <>
            {canApply ? (
              <Act kind="first" to={`${path}/apply`}>
                {t('acts.apply')}
              </Act>
            ) : null}
            {canWrite ? <Act to={`${path}/edit`}>{t('acts.newVersion')}</Act> : null}
          </>
        }
      />
      <div className="house-split">
        <div className="house-typed">
          <Panel title={t('use.title')} isFlush>
            {model.use.behind > 0 ? <Behind model={model} /> : null}
            {model.units.length === 0 ? (
              <Plain kind="empty" level={3} title={t('use.empty')}>
                {t('use.emptyText')}
              </Plain>
            ) : (
              <>
                <HouseUnits units={model.units} newest={model.version} />
                {model.areUnitsCut ? (
                  <p className="s t-brass part-words">{t('apply.cut', { count: model.units.length })}</p>
                ) : null}
              </>
            )}
          </Panel>
          <Versions model={model} />
          {canWrite ? <HouseModelName model={model} /> : null}
        </div>
        <aside aria-label={t('lots.section.title')}>
          <div className="house-drawing">
            <Cutaway house={drawnHouseOf(model.geometry)} method={null} fillLevelFt={null} units={units} />
          </div>
        </aside>
      </div>
    </>
  );
}

/** Lots keep the version they were given until the newest is offered to them. */
function Behind({ model }: { model: HouseModelDetail }): ReactNode {
  const { t } = useTranslation('houses');
  return (
    <div className="house-behind">
      <p>{t('use.behind', { count: model.use.behind })}</p>
      {model.abilities.canApply ? (
        <Act size="sm" to={`/lots/houses/${model.id}/apply?behind=1`}>
          {t('acts.offer', { version: model.version })}
        </Act>
      ) : null}
    </div>
  );
}

function Versions({ model }: { model: HouseModelDetail }): ReactNode {
  const { t } = useTranslation('houses');
  const words = useTimeWords();
  return (
    <Panel title={t('versions.title')} isFlush>
      <ul className="part-list">
        {model.versions.map(({ version, madeAt, madeByName }) => (
          <li key={version} className="row">
            <span className="b">{t('versions.one', { version })}</span>
            <span className="mid">
              {madeByName}, <Numeral text={words.dayClock(madeAt, ownZone)} />
            </span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
