import { useEffect, useRef, type ReactNode } from 'react';

export interface HouseFoldProps {
  title: string;
  /** How much is in it. */
  count?: number;
  /** How often the house was refused: after each time a fold opens where a fault lies in it. */
  refusals: number;
  children: ReactNode;
}

/** A finer part of the house's form, folded until it is asked for or something in it is wrong. */
export function HouseFold({ title, count, refusals, children }: HouseFoldProps): ReactNode {
  const fold = useRef<HTMLDetailsElement>(null);
  useEffect(() => {
    if (fold.current?.querySelector('[aria-invalid="true"]')) fold.current.open = true;
  }, [refusals]);
  return (
    <details className="house-fold" ref={fold}>
      <summary>
        <span className="b">{title}</span>
        {count === undefined ? null : <span className="n mid">{count}</span>}
      </summary>
      <div className="house-folded">{children}</div>
    </details>
  );
}
