import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Numeral } from '../../components/numeral';
import { RibbonEnd } from '../../drawings/week-ribbon';
import type { Calendar } from './ribbon-days';
import { useWaitingWords, type WaitingLine } from './use-waiting-lines';
import './waiting-end.css';

/** The right end of the ribbon: how much waits on you, else what others have not done, and the two most pressing lines. */
export function WaitingEnd({ calendar }: { calendar: Calendar | undefined }): ReactNode {
  const { t } = useTranslation('app');
  const words = useWaitingWords(calendar);
  if (words === null) return <span className="xs mut ribbon-rest">{t('waiting.nothing')}</span>;
  return (
    <RibbonEnd
      title={<Numeral text={words.title} />}
      isOnYou={words.isOnYou}
      lines={words.lines.map((line) => (
        <Line key={line.text} line={line} />
      ))}
    />
  );
}

function Line({ line: { text, to, isPastTime } }: { line: WaitingLine }): ReactNode {
  const look = `xs ${isPastTime ? 't-red' : 'mid'}`;
  return to === null ? (
    <span className={look}>
      <Numeral text={text} />
    </span>
  ) : (
    <Link className={look} to={to}>
      <Numeral text={text} />
    </Link>
  );
}
