import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { placeWords } from '../place-words';
import { CorrectionActs } from './correction-acts';

export interface CorrectionRowProps {
  correction: Correction;
  /** The zone of the lot's department: its days are told in it. Null while it is not known: then no day is told. */
  zone: string | null;
  /** Names the lot and leads to it. */
  hasLot?: boolean;
}

/** One correction: what, where, since when, and what the reader may do to it. */
export function CorrectionRow({ correction, zone, hasLot = true }: CorrectionRowProps): ReactNode {
  const { t } = useTranslation(['outcomes', 'marks', 'common']);
  const time = useTimeWords();
  const { lotId, lotNumber, tractName, number, state, severity, section, text } = correction;
  const lot = [t('common.lot', { number: lotNumber }), tractName].filter(Boolean).join(', ');
  const facts = [placeWords(t, correction), t(`severity.${severity}`), section].filter(Boolean).join(', ');
  return (
    <li className="correction-row">
      <Mark
        name={`correction-${state}`}
        number={number}
        size={28}
        title={`${t('correction.number', { number })}, ${t(`marks.correction-${state}`)}`}
      />
      <div className="grow">
        {hasLot ? (
          <Link className="s" to={`/lots/${lotId}`}>
            <Numeral text={lot} />
          </Link>
        ) : null}
        <p className="b words">{text}</p>
        <p className="s mid">
          <Numeral text={facts} />
        </p>
        {zone === null ? null : (
          <p className="s mid">
            <Numeral text={t('row.opened', { name: correction.openedBy, day: time.day(correction.openedAt, zone) })} />
          </p>
        )}
        {correction.reopenedWhy === null ? null : (
          <p className="s t-red">{t('row.reopened', { why: correction.reopenedWhy })}</p>
        )}
        {zone === null || correction.fixNote === null || correction.fixedAt === null ? null : (
          <p className="s mid words">
            <Numeral
              text={t('row.fixed', {
                name: correction.fixedBy ?? '',
                day: time.day(correction.fixedAt, zone),
                note: correction.fixNote,
              })}
            />
          </p>
        )}
        {zone === null || correction.acceptedAt === null ? null : (
          <p className="s t-green">
            <Numeral
              text={t('row.accepted', {
                name: correction.acceptedBy ?? '',
                day: time.day(correction.acceptedAt, zone),
              })}
            />
          </p>
        )}
        <CorrectionActs correction={correction} />
      </div>
    </li>
  );
}
