import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { Question } from '../../../components/question';
import { Failed } from '../../../lib/query-state';
import { houseModelsQuery, useApplyHouseModel } from '../api/house-models';

export interface HouseTakeProps {
  builderId: string;
  lotId: string;
  unit: LotDetail['units'][number];
}

/** Takes one unit's house from a model of the builder; asks first where it was measured or changed by hand. Nothing without a model. */
export function HouseTake({ builderId, lotId, unit }: HouseTakeProps): ReactNode {
  const { t } = useTranslation('houses');
  const navigate = useNavigate();
  const models = useQuery(houseModelsQuery(builderId));
  const [modelId, setModelId] = useState('');
  const [isAsked, setAsked] = useState(false);
  const applying = useApplyHouseModel(modelId);
  const items = models.data?.items ?? [];
  const model = items.find(({ id }) => id === modelId);
  const isByHand =
    unit.geometry !== null && (unit.model === null || unit.model === undefined || unit.model.changes.length > 0);
  if (models.isError) return <Failed error={models.error} level={2} onRetry={() => void models.refetch()} />;
  if (items.length === 0) return null;
  const take = (whenChanged: 'ask' | 'replace'): void => {
    if (model === undefined) return;
    applying.mutate(
      { expectedVersion: model.version, units: [{ lotId, unitNumber: unit.number, whenChanged }] },
      {
        onSuccess: () => {
          sayDone({ mark: 'sent', title: t('take.done', { name: model.name }) });
          void navigate(`/lots/${lotId}`);
        },
        onError: () => setAsked(false),
      },
    );
  };
  return (
    <Panel title={t('take.title')}>
      <div className="fields">
        <Field label={t('take.label')}>
          {(control) => (
            <select {...control} value={modelId} onChange={(event) => setModelId(event.target.value)}>
              <option value="">{t('take.choose')}</option>
              {items.map(({ id, name }) => (
                <option key={id} value={id}>
                  {name}
                </option>
              ))}
            </select>
          )}
        </Field>
        {applying.error !== null ? <Failed error={applying.error} level={3} /> : null}
        <div>
          <Act
            busy={applying.isPending}
            cannotYet={model === undefined ? t('apply.noneChosen') : undefined}
            onClick={() => (isByHand ? setAsked(true) : take('ask'))}
          >
            {t('take.act')}
          </Act>
        </div>
      </div>
      <Question
        isOpen={isAsked}
        title={t('take.question', { name: model?.name })}
        keepWord={t('take.keep')}
        endWord={t('take.replace')}
        busy={applying.isPending}
        onKeep={() => setAsked(false)}
        onEnd={() => take('replace')}
      >
        {t('take.told')}
      </Question>
    </Panel>
  );
}
