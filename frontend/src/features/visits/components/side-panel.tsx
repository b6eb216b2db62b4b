import { useEffect, useRef, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { PhoneHead } from '../../../components/head';
import { Icon } from '../../../components/icon';
import { useShortcut } from '../../../lib/shortcuts';
import { useIsPhone } from '../../../lib/use-media';
import '../side-panel.css';

export interface SidePanelProps {
  /** The small words over the title. */
  label: ReactNode;
  title: ReactNode;
  onClose: () => void;
  children: ReactNode;
  /** The act of the panel; at the thumb on a phone. */
  foot?: ReactNode;
}

/** What is open beside the page: a column on desk, a drawer on tablet, a page of its own on a phone. Escape closes it. */
export function SidePanel({ label, title, onClose, children, foot }: SidePanelProps): ReactNode {
  const { t } = useTranslation('common');
  const isPhone = useIsPhone();
  const heading = useRef<HTMLHeadingElement>(null);
  useShortcut('escape', onClose);
  useEffect(() => heading.current?.focus({ preventScroll: true }), []);
  if (isPhone) {
    return (
      <div className="side-page">
        <PhoneHead onBack={onClose} label={label} title={title} />
        <div className="side-body">{children}</div>
        {foot ? <div className="thumb">{foot}</div> : null}
      </div>
    );
  }
  return (
    <aside className="side">
      <div className="side-head">
        <div className="grow">
          <div className="lab">{label}</div>
          <h2 tabIndex={-1} ref={heading}>
            {title}
          </h2>
        </div>
        <button type="button" className="side-close" aria-label={t('close')} onClick={onClose}>
          <Icon name="close" />
        </button>
      </div>
      <div className="side-body">{children}</div>
      {foot ? <div className="side-foot">{foot}</div> : null}
    </aside>
  );
}
