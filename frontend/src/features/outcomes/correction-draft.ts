import type { CorrectionSubject, Severity } from '@holdwater/shared-types/outcomes/correction.states.js';
import type { NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';

/** A correction as it is being written. */
export interface CorrectionDraft extends Record<string, unknown> {
  unitNumber: number;
  place: NewCorrection['place'] | null;
  floor: string;
  room: string;
  text: string;
  severity: Severity;
  section: string;
}

interface Opened {
  readonly subject: CorrectionSubject;
  readonly unitNumber: number;
  readonly pointCode: string | null;
  readonly given: NewCorrection | null;
}

export function emptyCorrection({ unitNumber, given }: Opened): CorrectionDraft {
  return {
    unitNumber: given?.unitNumber ?? unitNumber,
    place: given?.place ?? null,
    floor: given?.floor ?? '',
    room: given?.room ?? '',
    text: given?.text ?? '',
    severity: given?.severity ?? 'fix-before-cover',
    section: given?.section ?? '',
  };
}

/** What the contract is asked to take; without a place it refuses. */
export function toNewCorrection(draft: CorrectionDraft, opened: Opened, clientId: string) {
  const orNull = (typed: string): string | null => (typed.trim() === '' ? null : typed.trim());
  return {
    clientId,
    unitNumber: draft.unitNumber,
    subject: opened.subject,
    pointCode: opened.given?.pointCode ?? opened.pointCode,
    text: draft.text,
    place: draft.place,
    floor: orNull(draft.floor),
    room: orNull(draft.room),
    severity: draft.severity,
    section: orNull(draft.section),
  };
}
