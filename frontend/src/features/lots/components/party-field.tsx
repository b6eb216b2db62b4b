import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import { Failed } from '../../../lib/query-state';
import { useDebounced } from '../../../lib/use-debounced';
import { partiesQuery } from '../api/organizations';

export interface PartyFieldProps {
  kind: OrganizationKind;
  value: OrganizationBrief | null;
  onChange: (organization: OrganizationBrief | null) => void;
  error?: string;
}

/** Finds an organization by name; it is asked, and on the lot only once it agrees. */
export function PartyField({ kind, value, onChange, error }: PartyFieldProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const [typed, setTyped] = useState('');
  const [isOpen, setIsOpen] = useState(false);
  const q = useDebounced(typed.trim());
  const found = useQuery({ ...partiesQuery(kind, q), enabled: isOpen && value === null });
  if (value !== null) {
    return (
      <div className="party-chosen spread">
        <span>
          <span className="lab">{t(`parties.${kind}`)}</span>
          <span className="b">{value.name}</span> <span className="n s mid">{value.phone ?? ''}</span>
        </span>
        <Act kind="text" size="sm" onClick={() => onChange(null)}>
          {t('parties.another')}
        </Act>
      </div>
    );
  }
  return (
    <div>
      <Field
        label={t(`parties.${kind}`)}
        type="search"
        isOptional
        autoComplete="off"
        maxLength={100}
        placeholder={t('parties.byName')}
        value={typed}
        error={error}
        onFocus={() => setIsOpen(true)}
        onChange={(event) => setTyped(event.target.value)}
      />
      {isOpen && found.isError ? <Failed error={found.error} level={3} onRetry={() => void found.refetch()} /> : null}
      {isOpen && found.data !== undefined ? (
        found.data.items.length === 0 ? (
          <p className="s mid">{t('parties.notFound')}</p>
        ) : (
          <ul className="party-found" aria-label={t('parties.found')}>
            {found.data.items.map((organization) => (
              <li key={organization.id}>
                <button type="button" onClick={() => onChange(organization)}>
                  <span className="med">{organization.name}</span>{' '}
                  <span className="n s mid">{organization.phone ?? ''}</span>
                </button>
              </li>
            ))}
          </ul>
        )
      ) : null}
    </div>
  );
}
