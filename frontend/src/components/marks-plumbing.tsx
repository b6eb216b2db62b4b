import type { ReactNode } from 'react';

const triangle = 'M10 1.8 18.6 17.4H1.4Z';

const studs = (
  <>
    <path d="M1.5 1.5H4v17H1.5zM16 1.5h2.5v17H16z" fill="var(--poche)" />
    <path d="M4 1.5v17M16 1.5v17" stroke="var(--ink)" strokeWidth="1.2" />
  </>
);

function pipe(color: string, filledFrom?: number): ReactNode {
  return (
    <>
      <path d="M7.8 1.5v17M12.2 1.5v17" stroke={color} strokeWidth="1.4" />
      {filledFrom === undefined ? null : (
        <path d={`M8.5 ${filledFrom}h3v${18.5 - filledFrom}h-3z`} fill="var(--water)" />
      )}
    </>
  );
}

/** The plumbing of a stage is a stud bay seen from the front; a correction is a triangle. */
export const plumbingGlyphs = {
  'not-tested': (
    <>
      {studs}
      <path d="M7.8 1.5v17M12.2 1.5v17" stroke="var(--ink3)" strokeWidth="1.3" strokeDasharray="2.4 1.8" />
    </>
  ),
  'under-test': (
    <>
      {studs}
      {pipe('var(--water)', 8)}
    </>
  ),
  'awaiting-visit': (
    <>
      {studs}
      {pipe('var(--water)', 1.5)}
      <path d="M6.6 6H5.4v8h1.2M13.4 6h1.2v8h-1.2" fill="none" stroke="var(--primer)" strokeWidth="1.5" />
    </>
  ),
  'corrections-open': (
    <>
      {studs}
      {pipe('var(--ink3)')}
      <path d="M10 4.2 15.6 14.6H4.4Z" fill="var(--red)" />
      <path d="M10 7.6v3.6M10 12v1.4" stroke="var(--paper)" strokeWidth="1.5" />
    </>
  ),
  'put-back-due': (
    <>
      {studs}
      <path d="M8.5 5h3v13.5h-3z" fill="var(--green)" />
      <path d="M7.8 5v13.5M12.2 5v13.5" stroke="var(--green)" strokeWidth="1.4" />
      <path d="M6.2 1.6h7.6v4H6.2z" fill="var(--brassFill)" stroke="var(--ink)" strokeWidth="1.1" />
    </>
  ),
  clear: (
    <>
      {studs}
      <path
        d="M5.6 2.6c12-1.2 11 3.4 4.2 3.2-5.6 0-5.6 3.7 0 3.7 6 0 6 3.7.2 3.7-5.6 0-5.6 3.7-.2 3.7 2.6 0 4.2.5 4.4 1.4"
        fill="none"
        stroke="var(--green)"
        strokeWidth="1.7"
      />
    </>
  ),
  'correction-open': <path d={triangle} fill="var(--red)" stroke="var(--red)" strokeWidth="1" strokeLinejoin="round" />,
  'correction-fixed': (
    <>
      <path d="M6 9.6h8L18 16.9H2Z" fill="var(--brassFill)" />
      <path d={triangle} fill="none" stroke="var(--ink)" strokeWidth="1.5" strokeLinejoin="round" />
    </>
  ),
  'correction-accepted': (
    <>
      <path d={triangle} fill="var(--paper)" stroke="var(--green)" strokeWidth="1.7" strokeLinejoin="round" />
      <path d="M7 12.6l2.2 2.2 4-4.4" fill="none" stroke="var(--green)" strokeWidth="1.8" />
    </>
  ),
};
