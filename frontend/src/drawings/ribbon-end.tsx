import type { ReactNode } from 'react';
import { Mark } from '../components/mark';

export interface RibbonEndProps {
  title: ReactNode;
  lines: readonly ReactNode[];
  /** Waits on the reader; else on others. */
  isOnYou?: boolean;
}

/** What waits, for the right end of the ribbon: a lozenge, a count in words, two lines. */
export function RibbonEnd({ title, lines, isOnYou = true }: RibbonEndProps): ReactNode {
  return (
    <>
      <span className="st">
        <Mark name={isOnYou ? 'waits-on-you' : 'waits-on'} />
        <span>{title}</span>
      </span>
      {lines.slice(0, 2).map((line, index) => (
        <div key={index}>{line}</div>
      ))}
    </>
  );
}
