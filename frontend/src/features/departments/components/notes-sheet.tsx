import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import type { Note, NoteRow } from '../rule-card-notes';

export interface NotesSheetProps {
  notes: readonly Note[];
  /** The version it is read against: what has changed is clouded. */
  against?: { notes: readonly Note[]; version: number };
  version: number;
}

const textOf = (row: NoteRow | undefined): string => row?.lines.join('\n') ?? '';

/** The numbered notes of a rule card; beside an older version where one is given. */
export function NotesSheet({ notes, against, version }: NotesSheetProps): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  return (
    <div className={`notes-sheet ${against ? 'two-versions' : ''}`}>
      {against ? (
        <div className="notes-row notes-head" aria-hidden="true">
          <span />
          <span className="b">{t('common.ruleCard', { version: against.version })}</span>
          <span className="b">{t('common.ruleCard', { version })}</span>
        </div>
      ) : null}
      {notes.map((note, index) => (
        <section key={note.key} id={`note-${index + 1}`} className="note" aria-labelledby={`note-${index + 1}-title`}>
          <span className="note-no n" aria-hidden="true">
            {index + 1}
          </span>
          <h2 className="h3" id={`note-${index + 1}-title`}>
            <span className="hidden-words">{t('noteNumber', { number: index + 1 })}</span> {note.title}
          </h2>
          <dl>
            {note.rows.map((row) => (
              <Row
                key={row.key}
                row={row}
                before={against ? findRow(against.notes, note.key, row.key) : undefined}
                isTwo={!!against}
              />
            ))}
          </dl>
        </section>
      ))}
    </div>
  );
}

function findRow(notes: readonly Note[], noteKey: string, rowKey: string): NoteRow | undefined {
  return notes.find(({ key }) => key === noteKey)?.rows.find(({ key }) => key === rowKey);
}

function Row({ row, before, isTwo }: { row: NoteRow; before: NoteRow | undefined; isTwo: boolean }): ReactNode {
  const { t } = useTranslation('departments');
  const isChanged = isTwo && textOf(before) !== textOf(row);
  return (
    <div className="notes-row">
      <dt className="mid">{row.label}</dt>
      {isTwo ? <dd>{before ? <Lines row={before} /> : <span className="mut">{t('notThere')}</span>}</dd> : null}
      <dd className={isChanged ? 'cloud' : undefined}>
        {isTwo && !isChanged ? <span className="mut">{t('same')}</span> : <Lines row={row} />}
        {isChanged ? ' ' : null}
        {isChanged ? <span className="hidden-words">{t('changed')}</span> : null}
      </dd>
    </div>
  );
}

function Lines({ row }: { row: NoteRow }): ReactNode {
  if (row.lines.length === 1) return <Numeral text={row.lines[0] ?? ''} />;
  return (
    <ul>
      {row.lines.map((line) => (
        <li key={line}>
          <Numeral text={line} />
        </li>
      ))}
    </ul>
  );
}

/** How many rows say something else than in the version before. */
export function countChanges(notes: readonly Note[], against: readonly Note[]): number {
  const rows = notes.flatMap((note) => note.rows.map((row) => ({ note, row })));
  return rows.filter(({ note, row }) => textOf(findRow(against, note.key, row.key)) !== textOf(row)).length;
}
