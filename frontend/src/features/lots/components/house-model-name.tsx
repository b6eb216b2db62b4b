import { renameHouseModel, type HouseModelDetail } from '@holdwater/shared-types/lots/house-model.contract.js';
import { useState, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { useRemoveHouseModel, useRenameHouseModel } from '../api/house-models';

/** Renames a model, or removes one that no lot uses. */
export function HouseModelName({ model }: { model: HouseModelDetail }): ReactNode {
  const { t } = useTranslation('houses');
  const form = useContractForm(renameHouseModel.body, { name: model.name });
  const renaming = useRenameHouseModel(model.id);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    if (!form.check(form.values)) return;
    renaming.mutate(form.values, {
      onError: form.takeError,
      onSuccess: ({ name }) => sayDone({ mark: 'sent', title: t('form.renamed', { name }) }),
    });
  };
  return (
    <Panel title={t('form.name')}>
      <form onSubmit={submit} noValidate className="fields">
        <Field
          label={t('form.nameLabel')}
          maxLength={60}
          value={form.values.name}
          error={form.faultOf('name')}
          onChange={(event) => form.set('name', event.target.value)}
        />
        {renaming.error !== null ? <Failed error={renaming.error} level={3} /> : null}
        <div className="row wrap">
          <Act type="submit" busy={renaming.isPending}>
            {t('acts.rename')}
          </Act>
          <Remove model={model} />
        </div>
      </form>
    </Panel>
  );
}

function Remove({ model }: { model: HouseModelDetail }): ReactNode {
  const { t } = useTranslation('houses');
  const navigate = useNavigate();
  const [isAsked, setAsked] = useState(false);
  const removing = useRemoveHouseModel(model.id, model.builderId);
  const failed = useErrorWords(removing.error);
  return (
    <>
      <Act
        kind="ending"
        cannotYet={model.use.lots > 0 ? t('remove.inUse', { count: model.use.lots }) : undefined}
        onClick={() => setAsked(true)}
      >
        {t('acts.remove')}
      </Act>
      <Question
        isOpen={isAsked}
        title={t('remove.title', { name: model.name })}
        keepWord={t('remove.keep')}
        endWord={t('acts.remove')}
        busy={removing.isPending}
        error={failed === null ? undefined : `${failed.title} ${failed.next}`}
        onKeep={() => setAsked(false)}
        onEnd={() =>
          removing.mutate(null, {
            onSuccess: () => {
              sayDone({ mark: 'sent', title: t('remove.done', { name: model.name }) });
              void navigate('/lots/houses');
            },
          })
        }
      >
        {t('remove.text')}
      </Question>
    </>
  );
}
