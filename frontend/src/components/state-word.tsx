import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark, type MarkSize } from './mark';
import { markTones, type MarkName, type MarkTone } from './mark-names';

export interface StateWordProps {
  /** Visit state, outcome, plumbing state, correction, test: any mark. */
  state: MarkName;
  /** Says more than the state's own word: "water not up". */
  word?: ReactNode;
  /** Replaces the state's own colour, such as brass once a deadline nears. */
  tone?: MarkTone;
  size?: MarkSize;
  number?: number;
}

/** Shape, word and colour of one state, in that order of importance. */
export function StateWord({ state, word, tone, size = 20, number }: StateWordProps): ReactNode {
  const { t } = useTranslation('marks');
  return (
    <span className={`st t-${tone ?? markTones[state]}`}>
      <Mark name={state} size={size} number={number} />
      <span>{word ?? t(`${state}`)}</span>
    </span>
  );
}
