import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { useEffect, useMemo, useState, type Dispatch, type SetStateAction } from 'react';
import { useMe } from '../../lib/session-context';
import { dropKeptOutcome, findKeptOutcome, keepOutcome, type KeptOutcome, type TypedCorrection } from './kept-outcome';
import { emptyOutcome, type OutcomeDraft } from './outcome-draft';

export interface KeptDraft {
  readonly draft: OutcomeDraft;
  readonly setDraft: Dispatch<SetStateAction<OutcomeDraft>>;
  /** The correction being written; null for none. */
  readonly correction: TypedCorrection | null;
  readonly setCorrection: Dispatch<SetStateAction<TypedCorrection | null>>;
  /** When what stands here was typed, where it came back after a reload or a closed tab; null for a new draft. */
  readonly cameBackFrom: string | null;
  /** It is recorded: nothing of it stays on the device. */
  readonly drop: () => void;
}

/** The draft of an outcome that outlives the page: kept on the device, per person and visit, until it is recorded. */
export function useKeptOutcome(visitId: string, earlier: readonly Correction[]): KeptDraft {
  const { id: personId } = useMe();
  const owner = useMemo(() => ({ personId, visitId }), [personId, visitId]);
  const [kept] = useState(() => findKeptOutcome(owner));
  const [draft, setDraft] = useState<OutcomeDraft>(() =>
    kept === null ? emptyOutcome : stillOpen(kept.draft, earlier),
  );
  const [correction, setCorrection] = useState<TypedCorrection | null>(kept?.correction ?? null);
  const [isRecorded, setIsRecorded] = useState(false);
  useEffect(() => {
    if (isRecorded) dropKeptOutcome(owner);
    else keepOutcome(owner, { draft: mutable(draft), correction }, new Date());
  }, [owner, draft, correction, isRecorded]);
  const drop = (): void => {
    // At once as well: the page may be left before the effect runs.
    dropKeptOutcome(owner);
    setIsRecorded(true);
  };
  return { draft, setDraft, correction, setCorrection, cameBackFrom: kept?.keptAt ?? null, drop };
}

/** A decision about a correction that somebody else has decided meanwhile could neither be seen nor taken back. */
function stillOpen(draft: KeptOutcome['draft'], earlier: readonly Correction[]): OutcomeDraft {
  const decisions = Object.entries(draft.decisions).filter(([id]) => earlier.some((one) => one.id === id));
  return { ...draft, decisions: Object.fromEntries(decisions) };
}

function mutable({ lookedAt, corrections, ...rest }: OutcomeDraft): KeptOutcome['draft'] {
  return { ...rest, lookedAt: [...lookedAt], corrections: [...corrections] };
}
