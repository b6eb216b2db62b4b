import type { ReactNode } from 'react';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Link, useNavigate } from 'react-router-dom';
import { Act } from '../../components/act';
import { sayDone } from '../../components/done-line';
import { Question } from '../../components/question';
import { useErrorWords } from '../../lib/errors';
import { useMe, useSession } from '../../lib/session-context';
import { useIsPhone } from '../../lib/use-media';
import { phoneSheetsFor, sheetsFor } from '../sheets';
import { useWorker } from '../use-worker';
import { LanguageChoice } from './language-choice';
import { openShortcutList } from './shortcut-list-state';
import { ThemeChoice } from './theme-choice';

/** Everything that is one's own: organizations, the pages the bars leave out, language, theme, the ways out. */
export function NamePanel({ id, onLeave }: { id: string; onLeave: () => void }): ReactNode {
  const { t } = useTranslation('app');
  return (
    <div className="name-panel floating" id={id} role="group" aria-label={t('nameMenuName')}>
      <Organizations onLeave={onLeave} />
      <OwnPages />
      <div className="name-block">
        <LanguageChoice isLabelShown />
        <ThemeChoice />
        <button
          type="button"
          className="link-like desk-only"
          onClick={() => {
            onLeave();
            openShortcutList();
          }}
        >
          {t('shortcuts.title')}
        </button>
      </div>
      <WaysOut />
    </div>
  );
}

function Organizations({ onLeave }: { onLeave: () => void }): ReactNode {
  const { t } = useTranslation(['app', 'common']);
  const me = useMe();
  const { chosen, isOperatorFrame, chooseOrganization } = useSession();
  const navigate = useNavigate();
  const choose = (organizationId: string | null): void => {
    chooseOrganization(organizationId);
    onLeave();
    void navigate('/');
  };
  return (
    <ul className="org-cells" aria-label={t('organizations')}>
      {me.memberships.map(({ organization, roles }) => (
        <OrganizationCell
          key={organization.id}
          name={organization.name}
          roles={roles.map((role) => t(`common.roles.${role}`)).join(', ')}
          isChosen={organization.id === chosen?.organization.id}
          onChoose={() => choose(organization.id)}
        />
      ))}
      {me.isOperator ? (
        <OrganizationCell
          name={t('installation')}
          roles={t('common.roles.operator')}
          isChosen={isOperatorFrame}
          onChoose={() => choose(null)}
        />
      ) : null}
    </ul>
  );
}

function OrganizationCell(props: { name: string; roles: string; isChosen: boolean; onChoose: () => void }): ReactNode {
  return (
    <li>
      <button
        type="button"
        className={props.isChosen ? 'dimmed on' : ''}
        aria-pressed={props.isChosen}
        onClick={props.onChoose}
      >
        <span className="b">{props.name}</span>
        <span className="xs mut">{props.roles}</span>
      </button>
    </li>
  );
}

function OwnPages(): ReactNode {
  const { t } = useTranslation('app');
  const worker = useWorker();
  const { chosen } = useSession();
  const isPhone = useIsPhone();
  const inBar = phoneSheetsFor(worker).map((sheet) => sheet.id);
  const left = isPhone ? sheetsFor(worker).filter((sheet) => !inBar.includes(sheet.id)) : [];
  return (
    <ul className="own-pages">
      {left.map((sheet) => (
        <li key={sheet.id}>
          <Link to={sheet.path}>{t(`sheets.${sheet.id}`)}</Link>
        </li>
      ))}
      {chosen === null ? null : (
        <>
          <li>
            <Link to="/people">{t('people')}</Link>
          </li>
          <li>
            <Link to="/consents">{t('consents')}</Link>
          </li>
        </>
      )}
      <li>
        <Link to="/settings">{t('settings')}</Link>
      </li>
    </ul>
  );
}

function WaysOut(): ReactNode {
  const { t } = useTranslation('app');
  const { signOut, signOutEverywhere } = useSession();
  const [isAsking, setIsAsking] = useState(false);
  const [isBusy, setIsBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const words = useErrorWords(error);
  const leave = (way: () => Promise<void>): void => {
    setIsBusy(true);
    setError(null);
    way().catch((fault: unknown) => {
      setError(fault);
      setIsBusy(false);
      sayDone({ mark: 'no-signal', title: t('notSignedOut') });
    });
  };
  return (
    <div className="name-block row">
      <Act size="sm" busy={isBusy} onClick={() => leave(signOut)}>
        {t('signOut')}
      </Act>
      <Act size="sm" kind="text" onClick={() => setIsAsking(true)}>
        {t('signOutEverywhere')}
      </Act>
      <Question
        isOpen={isAsking}
        title={t('everywhere.title')}
        keepWord={t('everywhere.keep')}
        endWord={t('everywhere.end')}
        onKeep={() => setIsAsking(false)}
        onEnd={() => leave(signOutEverywhere)}
        busy={isBusy}
        error={words === null ? undefined : `${words.title}. ${words.next}`}
      >
        {t('everywhere.text')}
      </Question>
    </div>
  );
}
