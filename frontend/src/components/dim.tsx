import type { ReactNode } from 'react';

export interface DimProps {
  /** The length and what it is of: "1 h 12 min left to request". */
  children: ReactNode;
  tone?: 'ink' | 'brass' | 'water' | 'primer';
}

/** A dimension line with slashed ends and the number in it: time left, driving, head, a silence. */
export function Dim({ children, tone = 'ink' }: DimProps): ReactNode {
  return (
    <div className={`dim ${tone}`}>
      <i />
      <span className="text">{children}</span>
      <i />
    </div>
  );
}
