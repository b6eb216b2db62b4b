import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useTimeWords } from '../../../lib/time';
import type { DayBoard } from '../api/day-board';
import { boardHours } from '../board-model';
import { byTime } from '../calendar-model';
import { BoardClosures } from './board-closures';
import { BoardRule } from './board-rule';
import { BoardStrip } from './board-strip';
import { useGridKeys } from './use-grid-keys';

export interface DayBoardViewProps {
  board: DayBoard;
  now: Date;
  chosenVisitId: string | null;
  onOpenVisit: (visitId: string) => void;
}

/** The day of a department: its rule with the requests on it, under it a strip per inspector. Arrow keys walk the visits. */
export function DayBoardView(props: DayBoardViewProps): ReactNode {
  const { board } = props;
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const hours = boardHours(board);
  const ids = [
    ...board.requests.map(({ id }) => id),
    ...board.inspectors.flatMap(({ visits }) => [...visits].sort(byTime).map(({ id }) => id)),
  ];
  const keys = useGridKeys('rows', ids);
  return (
    <div className="board-scroll">
      <div
        className="board"
        role="grid"
        aria-label={t('board.grid', { day: words.date(board.date) })}
        onKeyDown={keys.onKeyDown}
        onFocus={keys.onFocus}
      >
        <BoardRule {...props} hours={hours} keys={keys} />
        <BoardClosures board={board} hours={hours} />
        {board.inspectors.map((inspector) => (
          <BoardStrip key={inspector.id} {...props} inspector={inspector} hours={hours} keys={keys} />
        ))}
      </div>
    </div>
  );
}
