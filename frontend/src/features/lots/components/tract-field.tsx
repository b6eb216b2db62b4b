import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Failed } from '../../../lib/query-state';
import { useCreateTract } from '../api/create-tract';
import { tractsQuery } from '../api/tracts';

export interface TractFieldProps {
  builderId: string;
  value: string;
  onChange: (tractId: string) => void;
  error?: string;
}

const another = 'another';

/** The builder's tracts, none, or a new one. */
export function TractField({ builderId, value, onChange, error }: TractFieldProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const tracts = useQuery(tractsQuery());
  const [name, setName] = useState<string | null>(null);
  const creating = useCreateTract();
  const own = (tracts.data?.items ?? []).filter((tract) => tract.builderId === builderId);
  const create = (): void =>
    creating.mutate(
      { builderId, name: name ?? '' },
      {
        onSuccess: (tract) => {
          onChange(tract.id);
          setName(null);
          sayDone({ mark: 'sent', title: t('form.tractAdded', { name: tract.name }) });
        },
      },
    );
  return (
    <div className="fields">
      <Field label={t('head.tract')} error={error}>
        {(control) => (
          <select
            {...control}
            value={name === null ? value : another}
            onChange={(event) => {
              if (event.target.value === another) return setName('');
              setName(null);
              onChange(event.target.value);
            }}
          >
            <option value="">{t('form.noTract')}</option>
            {own.map((tract) => (
              <option key={tract.id} value={tract.id}>
                {tract.name}
              </option>
            ))}
            <option value={another}>{t('form.newTract')}</option>
          </select>
        )}
      </Field>
      {name === null ? null : (
        <Field
          label={t('form.tractName')}
          maxLength={120}
          value={name}
          onChange={(event) => setName(event.target.value)}
          trailing={
            <Act
              size="sm"
              busy={creating.isPending}
              cannotYet={name.trim() === '' ? t('form.nameMissing') : undefined}
              onClick={create}
            >
              {t('form.addTract')}
            </Act>
          }
        />
      )}
      {tracts.isError ? <Failed error={tracts.error} level={3} onRetry={() => void tracts.refetch()} /> : null}
      {creating.error !== null ? <Failed error={creating.error} level={3} /> : null}
    </div>
  );
}
