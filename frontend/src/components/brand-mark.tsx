import type { ReactNode } from 'react';

/** A pipe, primed at the joint, and the surveyor's sign for a water surface. */
export function BrandMark({ size = 28 }: { size?: number }): ReactNode {
  return (
    <svg className="ic" width={size} height={size} viewBox="0 0 28 28" aria-hidden="true">
      <path d="M6 12h8v14H6z" fill="var(--waterFill)" />
      <path d="M5.2 2v24.5M14.8 2v24.5" stroke="var(--ink)" strokeWidth="1.8" />
      <path d="M3 18.5h14v4.5H3z" fill="var(--primer)" />
      <path d="M6 11.5h20.5" stroke="var(--water)" strokeWidth="2" />
      <path d="M17 3.5h8.6L21.3 10.4Z" fill="none" stroke="var(--water)" strokeWidth="1.9" strokeLinejoin="round" />
      <path d="M18.5 15h5.6M20.2 18.3h2.2" stroke="var(--water)" strokeWidth="1.7" />
    </svg>
  );
}
