import type { ReactNode } from 'react';

export interface CountProps {
  value: number;
  /** Brass only when a person must do something. */
  tone?: 'brass' | 'quiet';
  /** Read aloud instead of the bare number: "4 open corrections". */
  label?: string;
}

/** A count beside a word; nothing at zero. */
export function Count({ value, tone = 'brass', label }: CountProps): ReactNode {
  if (value === 0) return null;
  return (
    <span className={`cnt ${tone === 'quiet' ? 'quiet' : ''}`}>
      <span aria-hidden={label ? true : undefined}>{value}</span>
      {label ? <span className="hidden-words">{label}</span> : null}
    </span>
  );
}
