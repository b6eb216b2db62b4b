import { useId, type ReactNode } from 'react';

export type PatternName = 'hatch' | 'not-under-test' | 'over-limit' | 'soil' | 'waves' | 'batt';

const drawn: Record<PatternName, { width: number; height: number; turned?: boolean; line: ReactNode }> = {
  hatch: { width: 6, height: 6, turned: true, line: <path d="M0 0V6" stroke="var(--hatch)" strokeWidth="1.3" /> },
  'not-under-test': {
    width: 4,
    height: 4,
    turned: true,
    line: <path d="M0 0V4" stroke="var(--ink2)" strokeWidth="1.2" />,
  },
  'over-limit': { width: 5, height: 5, turned: true, line: <path d="M0 0V5" stroke="var(--red)" strokeWidth="1.4" /> },
  soil: {
    width: 14,
    height: 10,
    line: <path d="M1 8l3-4M5 8l3-4M10 3l2-2" stroke="var(--hatch)" strokeWidth="1" />,
  },
  waves: {
    width: 16,
    height: 8,
    line: <path d="M0 4q4-3 8 0t8 0" fill="none" stroke="var(--water)" strokeWidth="1.1" />,
  },
  batt: {
    width: 22,
    height: 14,
    line: (
      <path
        d="M0 11c6 0 7-8 2.5-8S-1 11 5.5 11s8.5-8 5.5-8-5 8 2.5 8 9-8 5.5-8-4 8 3 8"
        fill="none"
        stroke="var(--green)"
        strokeWidth="1.1"
      />
    ),
  },
};

export interface Patterns {
  defs: ReactNode;
  fill: (name: PatternName) => string;
}

/** The patterns a drawing uses, under names of its own, so that two drawings on a page never share one that is hidden. */
export function usePatterns(names: readonly PatternName[]): Patterns {
  const id = useId();
  return {
    fill: (name) => `url(#${id}-${name})`,
    defs: (
      <defs>
        {names.map((name) => (
          <pattern
            key={name}
            id={`${id}-${name}`}
            width={drawn[name].width}
            height={drawn[name].height}
            patternUnits="userSpaceOnUse"
            patternTransform={drawn[name].turned ? 'rotate(45)' : undefined}
          >
            {drawn[name].line}
          </pattern>
        ))}
      </defs>
    ),
  };
}
