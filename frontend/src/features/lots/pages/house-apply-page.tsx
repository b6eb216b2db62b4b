import type { HouseModelDetail } from '@holdwater/shared-types/lots/house-model.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams, useSearchParams } from 'react-router-dom';
import { Field } from '../../../components/field';
import { Lines } from '../../../components/lines';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { houseModelQuery, modelledUnitsQuery } from '../api/house-models';
import { tractsQuery } from '../api/tracts';
import { HouseApply } from '../components/house-apply';
import { HouseHead } from '../components/house-head';
import '../lots.css';
import '../house-models.css';

/** Gives a house model to lots chosen from a tract's list, or its newest version to those at an earlier one. */
export function HouseApplyPage(): ReactNode {
  const { houseModelId = '' } = useParams();
  const model = useQuery(houseModelQuery(houseModelId));
  return (
    <QueryState query={model} loading={<Lines rows={8} />}>
      {(data) => <ApplyModel model={data} />}
    </QueryState>
  );
}

function ApplyModel({ model }: { model: HouseModelDetail }): ReactNode {
  const { t } = useTranslation('houses');
  const [search] = useSearchParams();
  const head = (
    <HouseHead
      title={t('apply.title', { name: model.name, version: model.version })}
      backTo={`/lots/houses/${model.id}`}
    />
  );
  if (!model.abilities.canApply) {
    return (
      <>
        {head}
        <Plain kind="none" title={t('apply.notYours')}>
          {t('apply.notYoursText')}
        </Plain>
      </>
    );
  }
  const behind = model.units.filter(({ isSame }) => !isSame);
  return (
    <>
      {head}
      {search.get('behind') === '1' ? (
        <HouseApply key={model.version} model={model} units={behind} isCut={model.areUnitsCut} areAllPicked />
      ) : (
        <ByTract model={model} />
      )}
    </>
  );
}

function ByTract({ model }: { model: HouseModelDetail }): ReactNode {
  const tracts = useQuery(tractsQuery());
  const [chosenId, setChosenId] = useState<string | null>(null);
  return (
    <QueryState query={tracts}>
      {({ items }) => {
        const own = items.filter(({ builderId }) => builderId === model.builderId);
        const usual = [...own].sort((a, b) => b.lotCount - a.lotCount)[0]?.id ?? 'none';
        const tractId = chosenId ?? usual;
        return (
          <>
            <TractChoice tracts={own} value={tractId} onChange={setChosenId} />
            <UnitsOfTract key={tractId} model={model} tractId={tractId} />
          </>
        );
      }}
    </QueryState>
  );
}

interface TractChoiceProps {
  tracts: ReadonlyArray<{ id: string; name: string }>;
  value: string;
  onChange: (tractId: string) => void;
}

function TractChoice({ tracts, value, onChange }: TractChoiceProps): ReactNode {
  const { t } = useTranslation('houses');
  return (
    <div className="house-tract">
      <Field label={t('apply.tract')}>
        {(control) => (
          <select {...control} value={value} onChange={(event) => onChange(event.target.value)}>
            {tracts.map(({ id, name }) => (
              <option key={id} value={id}>
                {name}
              </option>
            ))}
            <option value="none">{t('apply.noTract')}</option>
          </select>
        )}
      </Field>
    </div>
  );
}

function UnitsOfTract({ model, tractId }: { model: HouseModelDetail; tractId: string }): ReactNode {
  const units = useQuery(modelledUnitsQuery(model.id, tractId));
  return (
    <QueryState query={units} loading={<Lines rows={8} />}>
      {({ items, isCut }) => <HouseApply key={model.version} model={model} units={items} isCut={isCut} />}
    </QueryState>
  );
}
