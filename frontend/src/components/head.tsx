import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Icon } from './icon';

export interface HeadCell {
  label: ReactNode;
  value: ReactNode;
}

export interface HeadProps {
  /** The small word over the title: the page's kind. */
  label: ReactNode;
  title: ReactNode;
  /** What the page covers, its zone, rule card, counts. */
  cells?: readonly HeadCell[];
  /** Acts at the right end. */
  acts?: ReactNode;
  /** 1 for the page's own head, 2 for the head of a part. */
  level?: 1 | 2;
}

/** The head of a page on desk and tablet: a title block of ruled cells, label over value. */
export function Head({ label, title, cells = [], acts, level = 1 }: HeadProps): ReactNode {
  const Title = level === 1 ? 'h1' : 'h2';
  return (
    <header className="hd">
      <div className="c t">
        <div className="lab">{label}</div>
        <Title className="v">{title}</Title>
      </div>
      {cells.map((cell, index) => (
        <div className="c" key={index}>
          <div className="lab">{cell.label}</div>
          <div className="v">{cell.value}</div>
        </div>
      ))}
      {acts ? <div className="c x">{acts}</div> : null}
    </header>
  );
}

export interface PhoneHeadProps {
  /** Where the arrow leads; without it and `onBack` there is no arrow. */
  backTo?: string;
  onBack?: () => void;
  label: ReactNode;
  title: ReactNode;
  /** State at the right end: a mark with its word, or an act. */
  right?: ReactNode;
}

/** The head of a phone page: back, what it is, its state. */
export function PhoneHead({ backTo, onBack, label, title, right }: PhoneHeadProps): ReactNode {
  const { t } = useTranslation('marks');
  return (
    <header className="pt">
      {backTo !== undefined ? (
        <Link className="back" to={backTo} aria-label={t('page.back')}>
          <Icon name="left" size={24} />
        </Link>
      ) : null}
      {backTo === undefined && onBack ? (
        <button type="button" className="back" onClick={onBack} aria-label={t('page.back')}>
          <Icon name="left" size={24} />
        </button>
      ) : null}
      <div className="grow">
        <div className="lab">{label}</div>
        <h1 className="v">{title}</h1>
      </div>
      {right ? <div className="state">{right}</div> : null}
    </header>
  );
}
