import type { ReactNode } from 'react';
import { arcPath, polar } from './mark-geometry';

const rim = arcPath(10, 12, 7.8, 150, 390);

/** A small gauge: the tick is the minimum, the needle stands past it or not. */
function dial(needle: number, color: string, width = 1.5): ReactNode {
  const [x, y] = polar(10, 12, 6.2, needle);
  const [tx, ty] = polar(10, 12, 9.4, -50);
  const [ux, uy] = polar(10, 12, 6.2, -50);
  return (
    <>
      <path d={rim} fill="none" stroke={color} strokeWidth={width} strokeLinecap="round" />
      <path d={`M${tx} ${ty}L${ux} ${uy}`} stroke="var(--ink)" strokeWidth="1.6" />
      <path d={`M10 12L${x} ${y}`} stroke={color} strokeWidth="2" strokeLinecap="round" />
      <circle cx="10" cy="12" r="1.7" fill={color} />
    </>
  );
}

function falling(needle: number, color: string): ReactNode {
  return (
    <>
      {dial(needle, color)}
      <path d="M15.8 10.6v6.6M13.3 14.9l2.5 2.6 2.5-2.6" fill="none" stroke={color} strokeWidth="1.7" />
    </>
  );
}

const [shortX, shortY] = polar(10, 12, 6.2, -115);

/** Tests are a needle on a dial. */
export const testGlyphs = {
  'test-holds': dial(-20, 'var(--water)', 2.6),
  'test-temperature': (
    <>
      {dial(-26, 'var(--water)')}
      <path d="M16.6 13.2v3.2" stroke="var(--paper)" strokeWidth="5" strokeLinecap="round" />
      <path d="M16.6 11.4v4.4" stroke="var(--water)" strokeWidth="1.8" strokeLinecap="round" />
      <circle cx="16.6" cy="17" r="2" fill="var(--water)" />
    </>
  ),
  'test-short': (
    <>
      {dial(-60, 'var(--brass)')}
      <path d={`M10 12L${shortX} ${shortY}`} stroke="var(--brass)" strokeWidth="1.6" strokeDasharray="1.8 1.5" />
    </>
  ),
  'test-losing': (
    <>
      {dial(-150, 'var(--red)')}
      <path
        d="M16 11.4c1.7 2.5 2.3 3.5 2.3 4.4a2.3 2.3 0 0 1-4.6 0c0-.9.6-1.9 2.3-4.4Z"
        fill="var(--red)"
        stroke="var(--paper)"
        strokeWidth="1"
      />
    </>
  ),
  'test-slow-fall': falling(-26, 'var(--ink)'),
  'test-settling': falling(-70, 'var(--ink3)'),
  'test-gauge': (
    <>
      <path d={rim} fill="none" stroke="var(--brass)" strokeWidth="1.5" strokeLinecap="round" />
      <path
        d="M7.8 9.6c0-1.6 1-2.4 2.3-2.4s2.3.8 2.3 2.1c0 1.8-2.2 1.8-2.2 3.7"
        fill="none"
        stroke="var(--brass)"
        strokeWidth="1.8"
      />
      <circle cx="10.2" cy="15.4" r="1.1" fill="var(--brass)" />
    </>
  ),
  'test-few': (
    <>
      <path d={rim} fill="none" stroke="var(--ink3)" strokeWidth="1.6" strokeDasharray="1.6 2.2" />
      <circle cx="10" cy="12" r="1.7" fill="var(--ink3)" />
    </>
  ),
  'test-ended': dial(150, 'var(--ink3)'),
  'test-over': (
    <>
      <path d="M6.3 1.4h7.4l4.9 4.9v7.4l-4.9 4.9H6.3l-4.9-4.9V6.3z" fill="var(--red)" />
      <path d="M10 5.2v6M10 13v2" stroke="var(--paper)" strokeWidth="2.2" />
    </>
  ),
};
