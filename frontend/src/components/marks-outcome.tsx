import type { ReactNode } from 'react';

/** The body of a tag and of one torn off: also the empty outlines of answers not given. */
export const tagPath = 'M3.2 9.6 9.4 3.4H17V18.2H3.2Z';
export const tornTagPath = 'M3.2 9.6 9.4 3.4H17V18.2l-2.3-2.1-2.3 2.1-2.3-2.1-2.3 2.1-2.3-2.1-2.3 2.1Z';

/** A tag hangs on a string through its hole. */
function hung(color: string, hole: string): ReactNode {
  return (
    <>
      <path d="M8.7 8.5C6.4 7.6 3.4 5 1.2 1.2" fill="none" stroke={color} strokeWidth="1.5" strokeLinecap="round" />
      <circle cx="8.7" cy="8.5" r="2" fill={hole} />
    </>
  );
}

function openTag(color: string): ReactNode {
  return (
    <>
      <path d={tagPath} fill="var(--paper)" stroke={color} strokeWidth="1.6" strokeLinejoin="round" />
      {hung(color, color)}
    </>
  );
}

/** Outcomes are tags; the points of the work are squares. */
export const outcomeGlyphs = {
  pass: (
    <>
      <path d={tagPath} fill="var(--green)" />
      {hung('var(--green)', 'var(--paper)')}
      <path d="M6.9 13.3l2.7 2.7 5-5.3" fill="none" stroke="var(--paper)" strokeWidth="2" />
    </>
  ),
  fail: (
    <>
      <path d={tornTagPath} fill="var(--red)" />
      {hung('var(--red)', 'var(--paper)')}
      <path d="M9.3 9.9l5 5M14.3 9.9l-5 5" stroke="var(--paper)" strokeWidth="2" />
    </>
  ),
  'not-seen': (
    <>
      <path d={tagPath} fill="var(--paper)" stroke="var(--ink2)" strokeWidth="1.5" strokeLinejoin="round" />
      <path
        d="M4.5 14.2l2.6-2.6M5.4 17.2l6.4-6.4M9.4 17.2l6.4-6.4M13.4 17.2l2.5-2.5"
        stroke="var(--ink2)"
        strokeWidth="1.2"
      />
      {hung('var(--ink2)', 'var(--ink2)')}
    </>
  ),
  'not-ready': (
    <>
      {openTag('var(--brass)')}
      <path
        d="M9.2 11.2v3.2a1.1 1.1 0 0 0 1.1 1.1h2.4a1.1 1.1 0 0 0 1.1-1.1v-3.2"
        fill="none"
        stroke="var(--brass)"
        strokeWidth="1.6"
      />
    </>
  ),
  'no-access': (
    <>
      {openTag('var(--ink)')}
      <path d="M6.4 13.7h7.8" stroke="var(--ink)" strokeWidth="2.8" />
    </>
  ),
  'not-looked-at': <path d="M3.5 3.5h13v13h-13z" fill="none" stroke="var(--ink2)" strokeWidth="1.5" />,
  'looked-at': (
    <>
      <path d="M3.5 3.5h13v13h-13z" fill="none" stroke="var(--ink)" strokeWidth="1.5" />
      <path d="M6 10.2l3 3 6.5-8" fill="none" stroke="var(--ink)" strokeWidth="2" />
    </>
  ),
};
