import type { Notice } from '@holdwater/shared-types/notices/notice.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { noticeLink } from '../notice-link';
import { useNoticeWords } from '../notice-words';

export interface NoticeRowProps {
  notice: Notice;
  isNew: boolean;
  /** The reader's own zone: when the notice came. */
  zone: string;
}

/** One notice: what happened, where, and the way there. */
export function NoticeRow({ notice, isNew, zone }: NoticeRowProps): ReactNode {
  const { t } = useTranslation('notices');
  const time = useTimeWords();
  const { title, text, place, mark } = useNoticeWords()(notice);
  const number = notice.params['number'];
  const to = noticeLink(notice);
  const heading = (
    <span className={isNew ? 'b' : 'med'}>
      <Numeral text={title} />
    </span>
  );
  return (
    <li className={isNew ? 'notice new' : 'notice'}>
      <Mark name={mark} size={24} number={typeof number === 'number' ? number : undefined} />
      <div className="grow">
        <p>{to === null ? heading : <Link to={to}>{heading}</Link>}</p>
        {place === '' ? null : (
          <p className="s">
            <Numeral text={place} />
          </p>
        )}
        {text === '' ? null : (
          <p className="s mid notice-text">
            <Numeral text={text} />
          </p>
        )}
      </div>
      <span className="s mid nw at">
        {isNew ? <span className="t-primer b">{t('new')} </span> : null}
        <time dateTime={notice.at}>
          <Numeral text={time.clock(notice.at, zone)} />
        </time>
      </span>
    </li>
  );
}
