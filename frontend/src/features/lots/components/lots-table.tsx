import { useTranslation } from 'react-i18next';
import type { ReactNode } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { StateWord } from '../../../components/state-word';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { useTimeWords } from '../../../lib/time';
import type { LotRow } from '../lots-model';
import { useStandsWords, useWaitingWords, waitingMark } from '../waiting-words';

export interface LotsTableProps {
  rows: readonly LotRow[];
  /** The stage shown, in the reader's words. */
  stageName: string;
  chosenId: string | null;
  onChoose: (lotId: string) => void;
  /** Lots picked for one request; absent where nothing can be requested. */
  picked?: ReadonlySet<string>;
  onPick?: (lotId: string, isPicked: boolean) => void;
  /** More than one tract is shown. */
  hasTracts: boolean;
}

/** The lots as a table, the same one chosen as on the plat; on a phone as a list that opens each. */
export function LotsTable(props: LotsTableProps): ReactNode {
  const isPhone = useSheetWidth() === 'phone';
  return isPhone ? <PhoneLots {...props} /> : <DeskLots {...props} />;
}

function DeskLots({ rows, stageName, chosenId, onChoose, picked, onPick, hasTracts }: LotsTableProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const navigate = useNavigate();
  return (
    <table className="lots-table" aria-label={t('table.name')}>
      <thead>
        <tr>
          {onPick ? (
            <th scope="col">
              <span className="hidden-words">{t('table.pick')}</span>
            </th>
          ) : null}
          <th scope="col">{t('table.lot')}</th>
          <th scope="col">{stageName === '' ? t('table.plumbing') : t('table.plumbingAt', { stage: stageName })}</th>
          <th scope="col">{t('table.nextVisit')}</th>
          <th scope="col">{t('table.stands')}</th>
          <th scope="col">{t('table.waitsOn')}</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr
            key={row.lot.id}
            className={row.lot.id === chosenId ? 'chosen' : undefined}
            onClick={() => onChoose(row.lot.id)}
            onDoubleClick={() => void navigate(`/lots/${row.lot.id}`)}
          >
            {onPick ? (
              <td>
                <input
                  type="checkbox"
                  aria-label={t('table.pickLot', { number: row.lot.number })}
                  checked={picked?.has(row.lot.id) ?? false}
                  onClick={(event) => event.stopPropagation()}
                  onChange={(event) => onPick(row.lot.id, event.target.checked)}
                />
              </td>
            ) : null}
            <LotCells row={row} hasTracts={hasTracts} isChosen={row.lot.id === chosenId} />
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function LotCells({ row, hasTracts, isChosen }: { row: LotRow; hasTracts: boolean; isChosen: boolean }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const stands = useStandsWords();
  const waitingWords = useWaitingWords();
  const { lot, state, waiting } = row;
  return (
    <>
      <th scope="row">
        <button type="button" className="lot-pick" aria-pressed={isChosen} title={lot.address}>
          {waiting ? <Mark name={waitingMark(waiting)} title={waitingWords(waiting)} /> : <span className="mk" />}
          <span>
            <span className="hidden-words">{t('table.lot')}</span> <span className="n b">{lot.number}</span>
            {hasTracts && lot.tract ? <span className="xs mid row">{lot.tract.name}</span> : null}
          </span>
        </button>
      </th>
      <td>
        <StateWord state={state} />
      </td>
      <td className="mid">
        <NextVisit row={row} />
      </td>
      <td className="mid">{stands(row)}</td>
      <td className={waiting?.isOnYou ? 't-brass b' : 'mid'}>
        {waiting === null ? null : waiting.isOnYou ? t('table.you') : waiting.waitsOn}
      </td>
    </>
  );
}

function NextVisit({ row: { lot } }: { row: LotRow }): ReactNode {
  const { t } = useTranslation('common');
  const words = useTimeWords();
  if (lot.nextVisit === null) return t('none');
  const { startAt, zone } = lot.nextVisit;
  return (
    <span className="when">
      <Numeral text={words.dayClock(startAt, zone)} />
    </span>
  );
}

function PhoneLots({ rows, hasTracts }: LotsTableProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const stands = useStandsWords();
  const waitingWords = useWaitingWords();
  const words = useTimeWords();
  return (
    <ul className="lots-list" aria-label={t('table.name')}>
      {rows.map(({ lot, state, waiting }) => (
        <li key={lot.id}>
          <Link to={`/lots/${lot.id}`}>
            <span className="n lot-big">{lot.number}</span>
            <span className="grow">
              <StateWord state={state} />
              <span className="s mid row">{stands({ lot, state, waiting })}</span>
              {lot.nextVisit ? (
                <span className="s mid">
                  <Numeral text={words.dayWindow(lot.nextVisit.startAt, lot.nextVisit.endAt, lot.nextVisit.zone)} />
                </span>
              ) : null}
              {hasTracts && lot.tract ? <span className="s mid row">{lot.tract.name}</span> : null}
              {waiting ? (
                <span className={`s row ${waiting.isPastTime ? 't-red' : waiting.isOnYou ? 't-brass' : 'mid'}`}>
                  <Mark name={waitingMark(waiting)} />
                  <span>{waitingWords(waiting)}</span>
                </span>
              ) : null}
            </span>
          </Link>
        </li>
      ))}
    </ul>
  );
}
