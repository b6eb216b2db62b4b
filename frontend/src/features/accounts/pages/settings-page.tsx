import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { LanguageChoice } from '../../../app/layout/language-choice';
import { ThemeChoice } from '../../../app/layout/theme-choice';
import { useMe } from '../../../app/session';
import { Choice } from '../../../components/choice';
import { Head } from '../../../components/head';
import { Panel } from '../../../components/panel';
import { Failed } from '../../../lib/query-state';
import { useUpdateMe } from '../api/update-me';
import { AboutForm } from '../components/about-form';
import { PasswordForm } from '../components/password-form';

/** What is one's own: name, telephone, language, units, theme, password. */
export function SettingsPage(): ReactNode {
  const { t } = useTranslation(['accounts', 'common']);
  const me = useMe();
  return (
    <>
      <Head
        label={t('settings.label')}
        title={me.name}
        cells={me.memberships.map(({ organization, roles }) => ({
          label: organization.name,
          value: roles.map((role) => t(`common.roles.${role}`)).join(', '),
        }))}
      />
      <div className="two-columns">
        <Panel title={t('settings.about')}>
          <AboutForm />
        </Panel>
        <div>
          <Panel title={t('settings.reading')}>
            <div className="fields">
              <LanguageChoice isLabelShown />
              <UnitsChoice />
              <ThemeChoice />
            </div>
          </Panel>
          <Panel title={t('settings.password')}>
            <PasswordForm />
          </Panel>
        </div>
      </div>
    </>
  );
}

function UnitsChoice(): ReactNode {
  const { t } = useTranslation('accounts');
  const me = useMe();
  const saving = useUpdateMe();
  return (
    <>
      <Choice
        label={t('settings.units')}
        isLabelShown
        options={[
          { value: 'us', label: t('settings.us') },
          { value: 'metric', label: t('settings.metric') },
        ]}
        value={saving.isPending ? (saving.variables.units ?? me.units) : me.units}
        onChange={(units) => saving.mutate({ units })}
      />
      {saving.error === null ? null : <Failed error={saving.error} level={3} />}
    </>
  );
}
