import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark, type MarkName } from './mark';
import { Numeral } from './numeral';

export interface PlainProps {
  /** `empty` nothing here yet; `error` something failed; `taken` changed while you looked; `none` not yours or unknown. */
  kind: 'empty' | 'error' | 'taken' | 'none';
  /** What happened, as a heading. */
  title: ReactNode;
  /** What is safe, and why it happened. */
  children?: ReactNode;
  /** What to do next: one act, perhaps a second. */
  acts?: ReactNode;
  /** The entry number to name to support, with the time. */
  entry?: string;
  entryAt?: string;
  /** A drawing of what would stand here. */
  picture?: ReactNode;
  mark?: MarkName;
  level?: 1 | 2 | 3;
}

const kindMarks: Record<PlainProps['kind'], MarkName | undefined> = {
  empty: undefined,
  error: 'past-time',
  taken: 'waits-on-you',
  none: undefined,
};

/** The empty, failed, changed and unknown states of a page or panel: what happened, what is safe, what to do next. */
export function Plain(props: PlainProps): ReactNode {
  const { kind, title, children, acts, entry, entryAt, picture, level = 2 } = props;
  const { t } = useTranslation('marks');
  const Title = `h${level}` as const;
  const mark = props.mark ?? kindMarks[kind];
  return (
    <div className="plain" role={kind === 'error' ? 'alert' : undefined}>
      {picture ? <div className="picture">{picture}</div> : null}
      <div className="row">
        {mark ? <Mark name={mark} size={24} /> : null}
        <Title className="h2">{title}</Title>
      </div>
      {children ? <p className="mid">{children}</p> : null}
      {acts ? <div className="acts">{acts}</div> : null}
      {entry ? (
        <p className="entry xs mut">
          {t('page.entry')} <span className="n">{entry}</span>
          {entryAt ? (
            <>
              , <Numeral text={entryAt} />
            </>
          ) : null}
        </p>
      ) : null}
    </div>
  );
}
