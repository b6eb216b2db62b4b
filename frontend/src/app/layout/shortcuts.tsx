import { useEffect, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../components/act';
import { useModal } from '../../components/use-modal';
import { setSingleKeys, useShortcut, useSingleKeys } from '../../lib/shortcuts';
import { sheetsFor } from '../sheets';
import { useWorker } from '../use-worker';
import { closeShortcutList, openShortcutList, useIsShortcutListOpen } from './shortcut-list-state';
import './shortcuts.css';

const digits = ['1', '2', '3', '4', '5', '6', '7', '8', '9'] as const;
/** As printed; the words are `app.shortcuts.keys.<name>`. */
const keys = [
  ['/', 'find'],
  ['1–9', 'sheets'],
  ['← → ↑ ↓', 'arrows'],
  ['Enter', 'open'],
  ['Esc', 'close'],
  ['N', 'request'],
  ['P', 'place'],
  ['R', 'reading'],
  ['W', 'write'],
  ['?', 'list'],
] as const;

/** The keys that work on every page, and the list of all. */
export function Shortcuts(): ReactNode {
  const worker = useWorker();
  const navigate = useNavigate();
  const isOpen = useIsShortcutListOpen();
  useShortcut(digits, (digit) => {
    const sheet = sheetsFor(worker)[Number(digit) - 1];
    if (sheet !== undefined) void navigate(sheet.path);
  });
  useShortcut('?', openShortcutList);
  useEffect(() => closeShortcutList, []);
  return isOpen ? <ShortcutList /> : null;
}

function ShortcutList(): ReactNode {
  const { t } = useTranslation('app');
  const areOn = useSingleKeys();
  const dialog = useModal();
  return (
    <dialog ref={dialog} className="question" aria-labelledby="shortcut-title" onClose={closeShortcutList}>
      <div className="told">
        <h2 className="h2" id="shortcut-title">
          {t('shortcuts.title')}
        </h2>
        <dl className="shortcut-list">
          {keys.map(([key, name]) => (
            <div key={name}>
              <dt className="n">{key}</dt>
              <dd>{t(`shortcuts.keys.${name}`)}</dd>
            </div>
          ))}
        </dl>
        <label className="check-row">
          <input type="checkbox" checked={areOn} onChange={(event) => setSingleKeys(event.target.checked)} />
          <span>{t('shortcuts.areOn')}</span>
        </label>
      </div>
      <div className="acts">
        <Act onClick={closeShortcutList}>{t('shortcuts.close')}</Act>
      </div>
    </dialog>
  );
}
