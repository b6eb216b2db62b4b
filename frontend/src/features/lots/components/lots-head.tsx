import type { LotStage, LotSummary } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Tract } from '@holdwater/shared-types/lots/tract.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Field } from '../../../components/field';
import { PhoneHead } from '../../../components/head';
import { localName, useLocale } from '../../../lib/i18n';
import { useLotsAddress } from '../use-lots-address';

export interface LotsHeadProps {
  tracts: readonly Tract[];
  tract: Tract | null;
  lots: readonly LotSummary[];
  stages: readonly LotStage[];
  stageCode: string | null;
}

/** Which tract, whose department, how many lots, and the stage switch. */
export function LotsHead(props: LotsHeadProps): ReactNode {
  const { t } = useTranslation('lots');
  const { tract, lots } = props;
  const departments = [...new Set(lots.flatMap(({ departmentName }) => departmentName ?? []))];
  return (
    <header className="hd">
      <div className="c t">
        <div className="lab">{t('head.tract')}</div>
        <h1 className="v">{tract?.name ?? t('head.all')}</h1>
      </div>
      {props.tracts.length > 0 ? (
        <div className="c">
          <TractChoice {...props} />
        </div>
      ) : null}
      {departments.length > 0 ? (
        <div className="c">
          <div className="lab">{t('head.department', { count: departments.length })}</div>
          <div className="v">{departments.join(', ')}</div>
        </div>
      ) : null}
      <div className="c">
        <div className="lab">{t('head.lots')}</div>
        <div className="v n">{lots.length}</div>
      </div>
      <div className="c x">
        <StageChoice {...props} />
      </div>
    </header>
  );
}

/** On a phone: the tract, the stage, and table or plat. */
export function LotsPhoneHead(props: LotsHeadProps & { shown: number }): ReactNode {
  const { t } = useTranslation('lots');
  const { part, change } = useLotsAddress();
  const { tract, lots, shown } = props;
  return (
    <>
      <PhoneHead
        label={t('head.label')}
        title={tract?.name ?? t('head.all')}
        right={<span className="n">{t('table.shown', { shown, total: lots.length })}</span>}
      />
      <div className="phone-choices">
        {props.tracts.length > 0 ? <TractChoice {...props} /> : null}
        <StageChoice {...props} isWide />
        {lots.length > 0 ? (
          <Choice
            label={t('head.part')}
            wide
            options={(['table', 'plat'] as const).map((value) => ({ value, label: t(`head.parts.${value}`) }))}
            value={part}
            onChange={(value) => change({ part: value === 'plat' ? 'plat' : null })}
          />
        ) : null}
      </div>
    </>
  );
}

function TractChoice({ tracts, tract }: LotsHeadProps): ReactNode {
  const { t } = useTranslation('lots');
  const { change } = useLotsAddress();
  return (
    <Field label={t('head.choose')} labelPlace="inside">
      {(control) => (
        <select
          {...control}
          value={tract?.id ?? 'all'}
          onChange={(event) => change({ tract: event.target.value, lot: null, stage: null, filter: null })}
        >
          {tracts.map(({ id, name }) => (
            <option key={id} value={id}>
              {name}
            </option>
          ))}
          <option value="all">{t('head.all')}</option>
        </select>
      )}
    </Field>
  );
}

function StageChoice({ stages, stageCode, isWide }: LotsHeadProps & { isWide?: boolean }): ReactNode {
  const { t } = useTranslation('lots');
  const locale = useLocale();
  const { change } = useLotsAddress();
  if (stages.length === 0) return null;
  return (
    <Choice
      label={t('head.stage')}
      wide={isWide}
      options={stages.map(({ code, name }) => ({ value: code, label: localName(name, locale) }))}
      value={stageCode}
      onChange={(code) => change({ stage: code })}
    />
  );
}
