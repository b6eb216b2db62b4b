import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { StateWord } from '../../../components/state-word';
import { useTimeWords } from '../../../lib/time';
import type { LotRow } from '../lots-model';
import { useStandsWords, useWaitingWords } from '../waiting-words';

/** The title block of the lot chosen on plat and table. */
export function ChosenLot({ row, stageName }: { row: LotRow | null; stageName: string }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const stands = useStandsWords();
  const waitingWords = useWaitingWords();
  if (row === null) return <p className="chosen-lot none mid">{t('chosen.none')}</p>;
  const { lot, state, waiting } = row;
  return (
    <section className="chosen-lot" aria-label={t('common.lot', { number: lot.number })} aria-live="polite">
      <div className="c">
        <div className="lab">{t('table.lot')}</div>
        <div className="lot-number">{lot.number}</div>
      </div>
      <div className="c">
        <div className="lab">
          {stageName === '' ? t('table.plumbing') : t('table.plumbingAt', { stage: stageName })}
        </div>
        <StateWord state={state} size={24} />
        <div className="s mid">{stands(row)}</div>
      </div>
      <div className="c grow">
        <div className="lab">{t('table.nextVisit')}</div>
        <div className="h2">
          {lot.nextVisit === null ? (
            t('common.none')
          ) : (
            <Numeral text={words.dayWindow(lot.nextVisit.startAt, lot.nextVisit.endAt, lot.nextVisit.zone)} />
          )}
        </div>
        {waiting ? (
          <div className={`s b ${waiting.isPastTime ? 't-red' : 't-brass'}`}>
            <Numeral text={waitingWords(waiting)} />
          </div>
        ) : (
          <div className="s mid">{lot.address}</div>
        )}
      </div>
      <div className="c acts">
        <Act to={`/lots/${lot.id}/thread`}>{t('chosen.write')}</Act>
        <Act to={`/lots/${lot.id}`}>{t('chosen.open', { number: lot.number })}</Act>
      </div>
    </section>
  );
}
