import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { HouseModelDetail } from '@holdwater/shared-types/lots/house-model.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { useOrganization } from '../../../app/session';
import { sayDone } from '../../../components/done-line';
import { Lines } from '../../../components/lines';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { houseModelQuery, useAddHouseModelVersion, useCreateHouseModel } from '../api/house-models';
import { lotQuery } from '../api/lot';
import { HouseHead } from '../components/house-head';
import { HouseModelForm } from '../components/house-model-form';
import '../lots.css';
import '../house-models.css';

/** A new house model, from nothing or from a lot's house, or the next version of one. */
export function HouseModelFormPage(): ReactNode {
  const { houseModelId } = useParams();
  const [search] = useSearchParams();
  const lotId = search.get('lot');
  if (houseModelId !== undefined) return <KnownModel houseModelId={houseModelId} />;
  return lotId === null ? (
    <NewModel house={null} />
  ) : (
    <ModelOfLot lotId={lotId} unit={Number(search.get('unit') ?? 1)} />
  );
}

function ModelOfLot({ lotId, unit }: { lotId: string; unit: number }): ReactNode {
  const lot = useQuery(lotQuery(lotId));
  return (
    <QueryState query={lot} loading={<Lines rows={8} />}>
      {({ units }) => <NewModel house={units.find(({ number }) => number === unit)?.geometry ?? null} />}
    </QueryState>
  );
}

function NewModel({ house }: { house: HouseGeometry | null }): ReactNode {
  const { t } = useTranslation('houses');
  const navigate = useNavigate();
  const organization = useOrganization()?.organization;
  const creating = useCreateHouseModel();
  const head = <HouseHead title={t('form.newTitle')} backTo="/lots/houses" />;
  if (organization?.kind !== 'builder') {
    return (
      <>
        {head}
        <Plain kind="none" title={t('page.onlyBuilders')}>
          {t('page.onlyBuildersText')}
        </Plain>
      </>
    );
  }
  return (
    <>
      {head}
      <HouseModelForm
        house={house}
        name=""
        note={t('form.nameHint')}
        saveWord={t('form.save')}
        saving={creating}
        onSave={(geometry, name, onError) =>
          creating.mutate(
            { builderId: organization.id, name, geometry },
            {
              onError,
              onSuccess: (model) => {
                sayDone({ mark: 'sent', title: t('form.saved', { name: model.name }) });
                void navigate(`/lots/houses/${model.id}`);
              },
            },
          )
        }
      />
    </>
  );
}

function KnownModel({ houseModelId }: { houseModelId: string }): ReactNode {
  const model = useQuery(houseModelQuery(houseModelId));
  return (
    <QueryState query={model} loading={<Lines rows={8} />}>
      {(data) => <NextVersion key={data.version} model={data} />}
    </QueryState>
  );
}

function NextVersion({ model }: { model: HouseModelDetail }): ReactNode {
  const { t } = useTranslation('houses');
  const navigate = useNavigate();
  const saving = useAddHouseModelVersion(model.id);
  const path = `/lots/houses/${model.id}`;
  const head = (
    <HouseHead title={t('form.versionTitle', { name: model.name, version: model.version + 1 })} backTo={path} />
  );
  if (!model.abilities.canWrite) {
    return (
      <>
        {head}
        <Plain kind="none" title={t('form.notYours')}>
          {t('form.notYoursText')}
        </Plain>
      </>
    );
  }
  return (
    <>
      {head}
      <HouseModelForm
        house={model.geometry}
        name={null}
        note={t('form.versionNote', { version: model.version })}
        saveWord={t('form.saveVersion', { version: model.version + 1 })}
        saving={saving}
        onSave={(geometry, _name, onError) =>
          saving.mutate(
            { expectedVersion: model.version, geometry },
            {
              onError,
              onSuccess: ({ version }) => {
                const isSame = version === model.version;
                sayDone({ mark: 'sent', title: t(isSame ? 'form.sameHouse' : 'form.versionSaved', { version }) });
                void navigate(path);
              },
            },
          )
        }
      />
    </>
  );
}
