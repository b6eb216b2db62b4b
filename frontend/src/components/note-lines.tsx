import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from './mark';

export interface NoteLine {
  id: string;
  /** The point of the rule card's list, in the department's words. */
  text: string;
  isLookedAt: boolean;
  /** A correction opened at this point. */
  correction?: { number: number; state: 'correction-open' | 'correction-fixed' | 'correction-accepted' };
  /** A second line, such as the place of the correction. */
  note?: ReactNode;
}

export interface NoteLinesProps {
  /** Read aloud: what the list is. */
  label: string;
  lines: readonly NoteLine[];
  /** Left margin; without it the list is only read. */
  onLook?: (id: string, isLookedAt: boolean) => void;
  /** Right margin: opens a correction at the point, or the one that is there. */
  onCorrect?: (id: string) => void;
}

/** The work: ruled note lines. No act answers all of them. */
export function NoteLines({ label, lines, onLook, onCorrect }: NoteLinesProps): ReactNode {
  const { t } = useTranslation('marks');
  return (
    <ol aria-label={label}>
      {lines.map((line) => (
        <li key={line.id} className={`note-line ${line.isLookedAt ? 'looked' : ''}`}>
          <LookMargin line={line} onLook={onLook} />
          <span className="text">
            {line.text}
            {line.isLookedAt ? null : <span className="mut s row">{t('not-looked-at')}</span>}
            {line.note ? <span className="mid s row">{line.note}</span> : null}
          </span>
          <CorrectMargin line={line} onCorrect={onCorrect} />
        </li>
      ))}
    </ol>
  );
}

function LookMargin({ line, onLook }: { line: NoteLine; onLook?: NoteLinesProps['onLook'] }): ReactNode {
  const { t } = useTranslation('marks');
  const state = line.isLookedAt ? 'looked-at' : 'not-looked-at';
  if (!onLook) {
    return (
      <span className="margin">
        <Mark name={state} size={24} title={t(`${state}`)} />
      </span>
    );
  }
  return (
    <button
      type="button"
      role="checkbox"
      aria-checked={line.isLookedAt}
      aria-label={t('work.look', { point: line.text })}
      onClick={() => onLook(line.id, !line.isLookedAt)}
    >
      <Mark name={state} size={24} />
    </button>
  );
}

function CorrectMargin({ line, onCorrect }: { line: NoteLine; onCorrect?: NoteLinesProps['onCorrect'] }): ReactNode {
  const { t } = useTranslation('marks');
  const { correction } = line;
  const drawing = correction ? (
    <Mark name={correction.state} number={correction.number} size={28} />
  ) : (
    <svg className="mk mk24" viewBox="0 0 20 20" aria-hidden="true">
      <path d="M10 2.6 18 16.8H2Z" fill="none" stroke="var(--ink3)" strokeWidth="1.3" strokeLinejoin="round" />
    </svg>
  );
  const name = correction
    ? t('work.correction', { number: correction.number, point: line.text })
    : t('work.correct', { point: line.text });
  if (!onCorrect) {
    return (
      <span className="margin">
        {correction ? drawing : null}
        {correction ? <span className="hidden-words">{name}</span> : null}
      </span>
    );
  }
  return (
    <button type="button" aria-label={name} onClick={() => onCorrect(line.id)}>
      {drawing}
    </button>
  );
}
