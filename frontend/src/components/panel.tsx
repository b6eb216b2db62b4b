import type { ReactNode } from 'react';
import { useId } from 'react';

export interface PanelProps {
  title: ReactNode;
  /** Quiet words or acts at the right end of its head. */
  side?: ReactNode;
  /** A grey head, for parts of a part. */
  isQuiet?: boolean;
  /** Lets rows run to the panel's edges. */
  isFlush?: boolean;
  level?: 2 | 3;
  children: ReactNode;
}

/** A part of a page, divided by rules from the next. Give it its own empty, loading and error state inside. */
export function Panel({ title, side, isQuiet, isFlush, level = 2, children }: PanelProps): ReactNode {
  const id = useId();
  const Title = `h${level}` as const;
  return (
    <section className="panel" aria-labelledby={id}>
      <div className={`panel-head ${isQuiet ? 'quiet' : ''}`}>
        <Title className={`panel-title ${level === 2 ? 'h2' : 'h3'}`} id={id}>
          {title}
        </Title>
        {side ? <div className="panel-side">{side}</div> : null}
      </div>
      {isFlush ? children : <div className="panel-body">{children}</div>}
    </section>
  );
}
