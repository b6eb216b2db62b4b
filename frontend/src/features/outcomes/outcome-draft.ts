import type { RuleCardContent, Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { Correction, NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type {
  noAccessReasons,
  notReadyReasons,
  SystemAnswer,
} from '@holdwater/shared-types/outcomes/outcome.states.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { parseNumber } from '../holds/typed-reading';
import type { OutcomeToRecord } from './api/record-outcome';

export const needles = ['fell', 'stayed', 'jumped', 'was-open'] as const;
export type Needle = (typeof needles)[number];

export interface SystemDraft {
  readonly answer: SystemAnswer | null;
  readonly needle: Needle | null;
  /** psi, or inches below the rim, as typed. */
  readonly reading: string;
  readonly note: string;
}
export const emptySystem: SystemDraft = { answer: null, needle: null, reading: '', note: '' };

export type Decision = { readonly is: 'accept' } | { readonly is: 'reopen'; readonly why: string };

export interface OutcomeDraft {
  readonly kind: 'seen' | 'not-ready' | 'no-access';
  readonly notReady: (typeof notReadyReasons)[number] | null;
  readonly noAccess: (typeof noAccessReasons)[number] | null;
  readonly systems: Readonly<Record<string, SystemDraft>>;
  readonly lookedAt: readonly string[];
  readonly corrections: readonly NewCorrection[];
  readonly decisions: Readonly<Record<string, Decision>>;
  readonly note: string;
}

export const emptyOutcome: OutcomeDraft = {
  kind: 'seen',
  notReady: null,
  noAccess: null,
  systems: {},
  lookedAt: [],
  corrections: [],
  decisions: {},
  note: '',
};

/** One system of one unit, answered on its own. */
export interface Subject {
  readonly unitNumber: number;
  readonly system: System;
}

export function subjectKey({ unitNumber, system }: Subject): string {
  return `${unitNumber}.${system}`;
}

/** What an inspector looks at: every required system of every unit of the visit. */
export function subjectsOf(visit: Pick<VisitSummary, 'unitNumbers'>, stage: Pick<Stage, 'systems'>): Subject[] {
  const units = [...visit.unitNumbers].sort((a, b) => a - b);
  return units.flatMap((unitNumber) => stage.systems.map((system) => ({ unitNumber, system })));
}

export function stageOf(content: RuleCardContent, stageCode: string): Stage | null {
  return content.stages.find(({ code }) => code === stageCode) ?? null;
}

/** The corrections of before that this visit is about: of its stage and units, not accepted yet. */
export function earlierOf(
  corrections: readonly Correction[],
  visit: Pick<VisitSummary, 'stageCode' | 'unitNumbers'>,
): Correction[] {
  const own = corrections.filter(
    (one) =>
      one.stageCode === visit.stageCode && visit.unitNumbers.includes(one.unitNumber) && one.state !== 'accepted',
  );
  return own.sort((a, b) => a.number - b.number);
}

/** The outcome as it is sent; only for a draft with nothing missing. `isLevel` tells which systems are read with a tape. */
export function toRecord(
  draft: OutcomeDraft,
  subjects: readonly Subject[],
  expectedVersion: number,
  isLevel: (subject: Subject) => boolean,
): OutcomeToRecord {
  const note = draft.note.trim() === '' ? null : draft.note.trim();
  if (draft.kind === 'not-ready' && draft.notReady !== null) {
    return { expectedVersion, note, result: { kind: 'not-ready', reason: draft.notReady } };
  }
  if (draft.kind === 'no-access' && draft.noAccess !== null) {
    return { expectedVersion, note, result: { kind: 'no-access', reason: draft.noAccess } };
  }
  const decided = Object.entries(draft.decisions);
  return {
    expectedVersion,
    note,
    result: {
      kind: 'seen',
      systems: subjects.flatMap((subject) => systemResult(draft, subject, isLevel(subject))),
      lookedAt: [...draft.lookedAt],
      corrections: [...draft.corrections],
      accepted: decided.filter(([, { is }]) => is === 'accept').map(([id]) => id),
      reopened: decided.flatMap(([correctionId, decision]) =>
        decision.is === 'reopen' ? [{ correctionId, why: decision.why.trim() }] : [],
      ),
    },
  };
}

type SeenSystems = Extract<OutcomeToRecord['result'], { kind: 'seen' }>['systems'];

function systemResult(draft: OutcomeDraft, subject: Subject, isLevel: boolean): SeenSystems {
  const { answer, needle, reading, note } = draft.systems[subjectKey(subject)] ?? emptySystem;
  if (answer === null) return [];
  const value = parseNumber(reading);
  return [
    {
      ...subject,
      answer,
      needle: isLevel ? null : needle,
      ...(value === null ? {} : isLevel ? { levelIn: value } : { pressurePsi: value }),
      ...(note.trim() === '' ? {} : { note: note.trim() }),
    },
  ];
}
