import type { ReactNode } from 'react';

const lozenge = 'M10 1 19 10 10 19 1 10Z';
const tray = 'M2.5 11v5.5h15V11';

function level(color: string, filled: boolean): ReactNode {
  return (
    <>
      <path
        d="M5 4h10L10 11.6Z"
        fill={filled ? color : 'none'}
        stroke={color}
        strokeWidth="1.7"
        strokeLinejoin="round"
      />
      <path d="M1.5 12.4h17M5.5 15.2h9M8.3 18h3.4" stroke={color} strokeWidth="1.6" />
    </>
  );
}

const waitsOn = (
  <>
    <path d={lozenge} fill="var(--brassFill)" />
    <path d="M10 5.4v5.4M10 12.8v2" stroke="var(--onBrass)" strokeWidth="2.1" />
  </>
);

/** Levels, what waits, and the sending of entries. */
export const otherGlyphs = {
  level: level('var(--water)', false),
  now: level('var(--primer)', true),
  'waits-on-you': waitsOn,
  'waits-on': waitsOn,
  'past-time': (
    <>
      <path d={lozenge} fill="var(--red)" />
      <path d="M10 5.4v5.4M10 12.8v2" stroke="var(--paper)" strokeWidth="2.1" />
    </>
  ),
  photo: <circle cx="10" cy="10" r="8.8" fill="var(--paper)" stroke="var(--ink)" strokeWidth="1.3" />,
  sending: (
    <>
      <path d={tray} fill="none" stroke="var(--brass)" strokeWidth="1.8" />
      <path d="M10 13V3.4M6.6 6.6 10 3.2l3.4 3.4" fill="none" stroke="var(--brass)" strokeWidth="1.8" />
    </>
  ),
  sent: (
    <>
      <path d={tray} fill="none" stroke="var(--green)" strokeWidth="1.8" />
      <path d="M6 7.4l3 3 5.4-6.4" fill="none" stroke="var(--green)" strokeWidth="1.9" />
    </>
  ),
  'no-signal': (
    <>
      <path d="M4.2 16v-3M8.2 16V9.6M12.2 16V6M16.2 16V3" stroke="var(--ink)" strokeWidth="2.1" opacity=".45" />
      <path d="M2.4 3.6 17.6 17.4" stroke="var(--ink)" strokeWidth="1.9" />
    </>
  ),
};
