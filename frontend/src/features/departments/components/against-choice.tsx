import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import type { Against } from '../use-against';

/** Which version stands beside the one that is read. */
export function AgainstChoice({ against: { others, card, choose } }: { against: Against }): ReactNode {
  const { t } = useTranslation('departments');
  return (
    <Field label={t('against.label')} labelPlace="inside">
      {(control) => (
        <select
          {...control}
          value={card?.id ?? ''}
          onChange={(event) => choose(event.target.value === '' ? null : event.target.value)}
        >
          <option value="">{t('against.none')}</option>
          {others.map(({ id, version }) => (
            <option key={id} value={id}>
              {t('versions.name', { version })}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
