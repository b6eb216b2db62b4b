import type { ReactNode } from 'react';
import type { MarkName } from './mark-names';
import { otherGlyphs } from './marks-other';
import { outcomeGlyphs } from './marks-outcome';
import { plumbingGlyphs } from './marks-plumbing';
import { testGlyphs } from './marks-test';
import { visitGlyphs } from './marks-visit';

export type { MarkName } from './mark-names';
export type MarkSize = 16 | 20 | 24 | 28;

const glyphs: Record<MarkName, ReactNode> = {
  ...visitGlyphs,
  ...outcomeGlyphs,
  ...plumbingGlyphs,
  ...testGlyphs,
  ...otherGlyphs,
};

/** A correction's or photo's number, drawn on its mark. An accepted correction carries a check instead. */
function markNumber(name: MarkName, number: number): ReactNode {
  const two = number > 9 ? ' two' : '';
  if (name === 'photo') {
    return (
      <text x="10" y={number > 9 ? 13.5 : 14} textAnchor="middle" className={`photo-no${two}`}>
        {number}
      </text>
    );
  }
  if (name !== 'correction-open' && name !== 'correction-fixed') return null;
  return (
    <text
      x="10"
      y="15.4"
      textAnchor="middle"
      className={`mark-no${two} ${name === 'correction-open' ? 'on-red' : 'on-brass'}`}
    >
      {number}
    </text>
  );
}

/** The drawing alone, on its 20 grid, for use inside another SVG. */
export function MarkAt(props: { name: MarkName; x: number; y: number; size?: number; number?: number }): ReactNode {
  const { name, x, y, size = 20, number } = props;
  return (
    <svg x={x} y={y} width={size} height={size} viewBox="0 0 20 20" aria-hidden="true">
      {glyphs[name]}
      {number === undefined ? null : markNumber(name, number)}
    </svg>
  );
}

export interface MarkProps {
  name: MarkName;
  size?: MarkSize;
  /** For corrections and photos. */
  number?: number;
  /** Read aloud; without it the mark is hidden, because its word stands beside it. */
  title?: string;
  className?: string;
}

/** One of the state marks of the interface guide. */
export function Mark({ name, size = 20, number, title, className = '' }: MarkProps): ReactNode {
  const named = title ? { role: 'img', 'aria-label': title } : { 'aria-hidden': true };
  return (
    <svg className={`mk mk${size} ${className}`} viewBox="0 0 20 20" {...named}>
      {glyphs[name]}
      {number === undefined ? null : markNumber(name, number)}
    </svg>
  );
}
