import type { ReactNode } from 'react';
import type { MarkTone } from './mark-names';

export interface CellsProps {
  columns?: 1 | 2 | 3 | 4;
  children: ReactNode;
}

/** Cells of a title block, ruled together. */
export function Cells({ columns = 1, children }: CellsProps): ReactNode {
  return <dl className={`tb c${columns}`}>{children}</dl>;
}

export interface CellProps {
  label: ReactNode;
  children: ReactNode;
  /** Colour of the value. */
  tone?: MarkTone;
  /** Ground of the cell: what it says is a verdict, a call, a choice. */
  wash?: 'primer' | 'water' | 'brass' | 'green' | 'red';
  /** Spans all columns. */
  isWide?: boolean;
}

/** One cell: label over value. */
export function Cell({ label, children, tone, wash, isWide }: CellProps): ReactNode {
  const ground = wash ? `wash-${wash}` : '';
  return (
    <div className={`c ${isWide ? 'all' : ''} ${ground}`}>
      <dt className="lab">{label}</dt>
      <dd className={`v ${tone ? `t-${tone}` : ''}`}>{children}</dd>
    </div>
  );
}
