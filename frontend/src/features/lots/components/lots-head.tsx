import type { LotStage, LotSummary } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Tract } from '@holdwater/shared-types/lots/tract.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Field, type FieldControl } from '../../../components/field';
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
  const { lots } = props;
  const departments = [...new Set(lots.flatMap(({ departmentName }) => departmentName ?? []))];
  return (
    <header className="hd">
      <div className="c t">
        <div className="lab">{t('head.tract')}</div>
        <TractTitle {...props} />
      </div>
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

/** The tract's name as the page's title; with more than one it is chosen there. */
function TractTitle(props: LotsHeadProps): ReactNode {
  const { t } = useTranslation('lots');
  const name = props.tract?.name ?? t('head.all');
  if (props.tracts.length === 0) return <h1 className="v">{name}</h1>;
  return (
    <div className="tract-title">
      <h1 className="hidden-words">{name}</h1>
      <TractSelect {...props} aria-label={t('head.choose')} />
    </div>
  );
}

function TractSelect({
  tracts,
  tract,
  ...control
}: LotsHeadProps & Partial<FieldControl> & { 'aria-label'?: string }): ReactNode {
  const { t } = useTranslation('lots');
  const { change } = useLotsAddress();
  return (
    <select
      id={control.id}
      aria-label={control['aria-label']}
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
  );
}

function TractChoice(props: LotsHeadProps): ReactNode {
  const { t } = useTranslation('lots');
  return (
    <Field label={t('head.choose')} labelPlace="inside">
      {(control) => <TractSelect {...props} {...control} />}
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
