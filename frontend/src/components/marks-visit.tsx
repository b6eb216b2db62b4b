import type { ReactNode } from 'react';

const rim = 'M3.6 3H6.6M13.4 3H16.4';
const stroke = { fill: 'none', strokeWidth: 1.6, strokeLinecap: 'round', strokeLinejoin: 'round' } as const;

function fluid(top: number): ReactNode {
  return <path d={`M6.8 ${top}h6.4V15.4a1.2 1.2 0 0 1-1.2 1.2H8a1.2 1.2 0 0 1-1.2-1.2Z`} fill="var(--water)" />;
}

function vessel(color: string, inside?: ReactNode, dashed = false): ReactNode {
  return (
    <>
      {inside}
      <g {...stroke} stroke={color}>
        <path d="M6 3V15.4a2 2 0 0 0 2 2h4a2 2 0 0 0 2-2V3" strokeDasharray={dashed ? '2.4 2.2' : undefined} />
        <path d={rim} />
      </g>
    </>
  );
}

/** A visit is a vessel; it fills as its tests stand. */
export const visitGlyphs = {
  requested: vessel('var(--ink2)', undefined, true),
  booked: vessel('var(--ink)'),
  'part-up': vessel('var(--ink)', fluid(10)),
  ready: vessel('var(--water)', fluid(4.6)),
  underway: (
    <>
      {vessel('var(--water)', fluid(4.6))}
      <circle cx="14.6" cy="13.4" r="4.6" fill="var(--paper)" />
      <circle cx="14.6" cy="13.4" r="3.6" fill="none" stroke="var(--primer)" strokeWidth="1.7" />
      <circle cx="14.6" cy="13.4" r="1.3" fill="var(--primer)" />
    </>
  ),
  withdrawn: (
    <>
      {vessel('var(--ink3)', undefined, true)}
      <path d="M3 17.5 17 4" stroke="var(--ink3)" strokeWidth="1.8" />
    </>
  ),
  declined: (
    <>
      <path
        {...stroke}
        d="M6 6.5V15.4a2 2 0 0 0 2 2h4a2 2 0 0 0 2-2V6.5"
        stroke="var(--ink2)"
        strokeDasharray="2.4 2.2"
      />
      <path d="M3.2 3.6h13.6" stroke="var(--ink2)" strokeWidth="2.8" />
    </>
  ),
  freed: (
    <>
      <g {...stroke} stroke="var(--brass)">
        <path d="M6 3V11M14 3V11" />
        <path d={rim} />
      </g>
      <path
        d="M8 12.2c1.1 1.6 1.5 2.2 1.5 2.8a1.5 1.5 0 0 1-3 0c0-.6.4-1.2 1.5-2.8ZM12.4 14c1.1 1.6 1.5 2.2 1.5 2.8a1.5 1.5 0 0 1-3 0c0-.6.4-1.2 1.5-2.8Z"
        fill="var(--brass)"
      />
    </>
  ),
  standby: (
    <>
      <g {...stroke} stroke="var(--ink2)">
        <path d="M11 4V14.4a2 2 0 0 0 2 2h1.4a2 2 0 0 0 2-2V4" strokeDasharray="2.2 2" />
        <path d="M9.2 4H11M16.4 4h2" />
      </g>
      <path {...stroke} d="M8 10H1.8M4.4 7.2 1.6 10l2.8 2.8" stroke="var(--primer)" strokeWidth="1.7" />
    </>
  ),
};
