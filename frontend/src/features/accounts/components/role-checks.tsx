import { rolesOfKind, type MemberRole, type OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import { useId, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../../../components/icon';

export interface RoleChecksProps {
  kind: OrganizationKind;
  roles: readonly MemberRole[];
  onChange: (roles: MemberRole[]) => void;
  /** Read aloud as the group's name. */
  label: string;
  error?: string;
}

/** The roles a person may have in an organization of this kind; any number of them. */
export function RoleChecks({ kind, roles, onChange, label, error }: RoleChecksProps): ReactNode {
  const { t } = useTranslation('common');
  const noteId = useId();
  const toggle = (role: MemberRole, isOn: boolean): void => {
    const others = roles.filter((one) => one !== role);
    // Kept in the order of the table, so that equal choices are equal inputs.
    onChange(rolesOfKind[kind].filter((one) => others.includes(one) || (isOn && one === role)));
  };
  return (
    <fieldset aria-describedby={error === undefined ? undefined : noteId}>
      <legend className="lab">{label}</legend>
      {rolesOfKind[kind].map((role) => (
        <label key={role} className="check-row">
          <input
            type="checkbox"
            checked={roles.includes(role)}
            onChange={(event) => toggle(role, event.target.checked)}
          />
          <span>{t(`roles.${role}`)}</span>
        </label>
      ))}
      {error === undefined ? null : (
        <div className="field-error" id={noteId}>
          <Icon name="caution" size={16} />
          <span>{error}</span>
        </div>
      )}
    </fieldset>
  );
}
