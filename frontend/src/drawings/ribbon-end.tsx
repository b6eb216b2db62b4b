import type { ReactNode } from 'react';
import { Mark } from '../components/mark';

/** What waits on you, for the right end of the ribbon: a lozenge, a count in words, two lines. */
export function RibbonEnd({ title, lines }: { title: ReactNode; lines: readonly ReactNode[] }): ReactNode {
  return (
    <>
      <span className="st">
        <Mark name="waits-on-you" />
        <span>{title}</span>
      </span>
      {lines.slice(0, 2).map((line, index) => (
        <div key={index}>{line}</div>
      ))}
    </>
  );
}
