import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Mark } from '../../../components/mark';
import { StateWord } from '../../../components/state-word';
import { localName, useLocale } from '../../../lib/i18n';
import { unitState, type LotView } from '../lot-view';

/** The head of the title block: number, tract, address. On a phone the page's own head says this. */
export function TitleNumber({ lot }: { lot: LotDetail }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  return (
    <header className="title-number">
      <div className="c">
        <div className="lab">{t('table.lot')}</div>
        <h1 className="lot-number">
          <span className="hidden-words">{t('table.lot')}</span> {lot.number}
        </h1>
      </div>
      <div className="c">
        <div className="lab">{t('head.tract')}</div>
        <div className="b">{lot.tract?.name ?? t('common.none')}</div>
        <div className="lab">{t('title.address')}</div>
        <div className="b">{lot.address}</div>
        {lot.abilities.canEdit || lot.abilities.canSetPermit ? (
          <Act size="sm" to={`/lots/${lot.id}/edit`}>
            {t('title.edit')}
          </Act>
        ) : null}
      </div>
    </header>
  );
}

/** The plumbing state, large, of the stage and unit looked at; under it the stages. */
export function TitleState({ lot, view }: { lot: LotDetail; view: LotView }): ReactNode {
  const { t } = useTranslation(['lots', 'marks', 'common']);
  const locale = useLocale();
  const { stage, unitNumber } = view;
  if (stage === null) {
    return (
      <div className="title-cell">
        <div className="lab">{t('table.plumbing')}</div>
        <p className="mid">{t('title.noStages')}</p>
      </div>
    );
  }
  const state = unitState(stage, unitNumber);
  return (
    <>
      <div className="title-cell title-state" aria-live="polite">
        <div className="lab">{t('table.plumbingAt', { stage: localName(stage.name, locale) })}</div>
        <div className="h1">
          <StateWord state={state} size={28} word={state === 'clear' ? t('title.plumbingClear') : undefined} />
        </div>
        {state === 'clear' ? <p className="s mid">{t('title.clearSays')}</p> : null}
        {lot.openCorrections > 0 ? (
          <p className="s t-red b">{t('stands.openCorrections', { count: lot.openCorrections })}</p>
        ) : null}
      </div>
      <div className="title-stages">
        <Choice
          label={t('head.stage')}
          wide
          options={lot.stages.map((one) => ({
            value: one.code,
            label: (
              <>
                {localName(one.name, locale)}
                <span className="xs row">
                  <Mark name={unitState(one, unitNumber)} size={16} />
                  {t(`marks.${unitState(one, unitNumber)}`)}
                </span>
              </>
            ),
          }))}
          value={stage.code}
          onChange={(code) => view.show({ stage: code })}
        />
        {lot.units.length > 1 ? (
          <Choice
            label={t('title.unit')}
            wide
            options={lot.units.map(({ number, label }) => ({ value: String(number), label }))}
            value={String(unitNumber)}
            onChange={(unit) => view.show({ unit })}
          />
        ) : null}
      </div>
    </>
  );
}
