import { useEffect, useId, useRef, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useLocation } from 'react-router-dom';
import { Icon } from '../../components/icon';
import { useMe, useSession } from '../../lib/session-context';
import { NamePanel } from './name-panel';
import './name-menu.css';

/** Who is signed in, for whom and as what; opens the panel with everything that is one's own. */
export function NameMenu({ isPhone = false }: { isPhone?: boolean }): ReactNode {
  const me = useMe();
  const { t } = useTranslation('app');
  // open on the page it was opened on: going elsewhere closes it
  const [openOn, setOpenOn] = useState<string | null>(null);
  const box = useRef<HTMLDivElement>(null);
  const opener = useRef<HTMLButtonElement>(null);
  const id = useId();
  const { key } = useLocation();
  const isOpen = openOn === key;
  const setIsOpen = (isOpening: boolean): void => setOpenOn(isOpening ? key : null);
  useDismiss(isOpen, box, () => setIsOpen(false), opener);
  return (
    <div className={isPhone ? 'name-menu phone' : 'cell name-menu'} ref={box}>
      <button
        type="button"
        ref={opener}
        className="name-opener"
        aria-expanded={isOpen}
        aria-controls={`${id}-panel`}
        onClick={() => setIsOpen(!isOpen)}
      >
        <span className="who">
          <span className="b s">{me.name}</span>
          <WorksFor />
        </span>
        <span className="hidden-words">, {t('nameMenu')}</span>
        <Icon name={isOpen ? 'up' : 'down'} size={14} />
      </button>
      {isOpen ? <NamePanel id={`${id}-panel`} onLeave={() => setIsOpen(false)} /> : null}
    </div>
  );
}

function WorksFor(): ReactNode {
  const { chosen, isOperatorFrame } = useSession();
  const { t } = useTranslation(['app', 'common']);
  if (isOperatorFrame) return <span className="xs mut">{t('common.roles.operator')}</span>;
  if (chosen === null) return null;
  const roles = chosen.roles.map((role) => t(`common.roles.${role}`)).join(', ');
  return (
    <span className="xs mut">
      {roles}, {chosen.organization.name}
    </span>
  );
}

/** Escape closes and gives the focus back; a press or the focus elsewhere closes. */
function useDismiss(
  isOpen: boolean,
  box: React.RefObject<HTMLElement | null>,
  onClose: () => void,
  opener: React.RefObject<HTMLElement | null>,
): void {
  const latest = useRef(onClose);
  useEffect(() => {
    latest.current = onClose;
  });
  useEffect(() => {
    if (!isOpen) return undefined;
    const elsewhere = (event: Event): void => {
      if (event.target instanceof Node && !box.current?.contains(event.target)) latest.current();
    };
    const press = (event: KeyboardEvent): void => {
      if (event.key !== 'Escape') return;
      latest.current();
      opener.current?.focus();
    };
    document.addEventListener('pointerdown', elsewhere);
    document.addEventListener('focusin', elsewhere);
    document.addEventListener('keydown', press);
    return () => {
      document.removeEventListener('pointerdown', elsewhere);
      document.removeEventListener('focusin', elsewhere);
      document.removeEventListener('keydown', press);
    };
  }, [isOpen, box, opener]);
}
