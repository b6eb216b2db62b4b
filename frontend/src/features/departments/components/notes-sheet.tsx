import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { SheetNote, SheetRow } from '../sheet-notes';
import { Cloud } from './cloud';
import { ChangedLines, RowLines } from './row-lines';

export interface NotesSheetProps {
  notes: readonly SheetNote[];
  version: number;
  /** The version beside it: what has changed is clouded. */
  againstVersion: number | null;
}

/** The numbered notes of a rule card; beside another version where one is given. */
export function NotesSheet({ notes, version, againstVersion }: NotesSheetProps): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const isTwo = againstVersion !== null;
  return (
    <div className={`notes-sheet ${isTwo ? 'two-versions' : ''}`}>
      {isTwo ? (
        <div className="notes-row notes-head" aria-hidden="true">
          <span />
          <span className="b">{t('versions.name', { version: againstVersion })}</span>
          <span className="b">{t('versions.name', { version })}</span>
        </div>
      ) : null}
      {notes.map((note, index) =>
        note.rows.length === 0 ? null : <Note key={note.key} note={note} number={index + 1} isTwo={isTwo} />,
      )}
    </div>
  );
}

function Note({ note, number, isTwo }: { note: SheetNote; number: number; isTwo: boolean }): ReactNode {
  const { t } = useTranslation('departments');
  return (
    <section id={`note-${number}`} className="rule-note" aria-labelledby={`note-${number}-title`}>
      <span className="note-no n" aria-hidden="true">
        {number}
      </span>
      <h2 className="h3" id={`note-${number}-title`}>
        <span className="hidden-words">{t('noteNumber', { number })}</span> {note.title}
      </h2>
      <dl>
        {note.rows.map((row) => (
          <div className="notes-row" key={row.key}>
            <dt className="mid">{row.label}</dt>
            {isTwo ? <TwoVersions row={row} /> : <dd>{row.lines === null ? null : <RowLines lines={row.lines} />}</dd>}
          </div>
        ))}
      </dl>
    </section>
  );
}

function TwoVersions({ row: { lines, before, isChanged } }: { row: SheetRow }): ReactNode {
  const { t } = useTranslation('departments');
  const notThere = <span className="mut">{t('notThere')}</span>;
  return (
    <>
      <dd>{before === null ? notThere : <RowLines lines={before} />}</dd>
      {isChanged ? (
        <dd>
          <Cloud>
            {lines === null ? notThere : <ChangedLines lines={lines} before={before ?? []} />}{' '}
            <span className="hidden-words">{t('changed')}</span>
          </Cloud>
        </dd>
      ) : (
        <dd className="mut">{t('same')}</dd>
      )}
    </>
  );
}
