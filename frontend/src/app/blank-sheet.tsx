import type { ReactNode } from 'react';
import { Lines } from '../components/lines';

/** The sheet with its frame drawn and nothing known yet. */
export function BlankSheet(): ReactNode {
  return (
    <main className="sheet">
      <Lines />
    </main>
  );
}
