import type { ReactNode } from 'react';

/** A daub of primer: the uneven band that marks "you are here" in the top bar and the phone bar. */
export function Daub(): ReactNode {
  return (
    <svg className="daub" viewBox="0 0 100 8" preserveAspectRatio="none" aria-hidden="true">
      <path
        d="M1 3.2C9 1.2 17 2.3 27 1.7 41 .9 52 2.2 66 1.3c11-.7 22-.1 32.5.7l.8 2.9c-8 2-15 1.2-24 1.8-13 .9-25-.3-38 .5-12 .7-22 .2-35-.9Z"
        fill="var(--primer)"
      />
    </svg>
  );
}
