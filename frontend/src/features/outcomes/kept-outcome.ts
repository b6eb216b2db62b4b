import { correctionPlace, newCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { correctionSubjects, severities } from '@holdwater/shared-types/outcomes/correction.states.js';
import { noAccessReasons, notReadyReasons, systemAnswers } from '@holdwater/shared-types/outcomes/outcome.states.js';
import { z } from 'zod';
import { needles } from './outcome-draft';

/** Raised when the shape below changes: what an older page kept is then let go rather than misread. */
const keptVersion = 1;
const keyStart = 'holdwater.outcome-draft.';
/** What nobody came back to is let go: by then the visit is long ended. */
const keptDays = 14;

const systemDraft = z.object({
  answer: z.enum(systemAnswers).nullable(),
  needle: z.enum(needles).nullable(),
  reading: z.string(),
  note: z.string(),
});
const decision = z.discriminatedUnion('is', [
  z.object({ is: z.literal('accept') }),
  z.object({ is: z.literal('reopen'), why: z.string() }),
]);
const outcomeDraft = z.object({
  kind: z.enum(['seen', 'not-ready', 'no-access']),
  notReady: z.enum(notReadyReasons).nullable(),
  noAccess: z.enum(noAccessReasons).nullable(),
  systems: z.record(z.string(), systemDraft),
  lookedAt: z.array(z.string()),
  corrections: z.array(newCorrection),
  decisions: z.record(z.string(), decision),
  note: z.string(),
});
/** A correction that was being written. */
const typedCorrection = z.object({
  subject: z.enum(correctionSubjects),
  unitNumber: z.number().int(),
  pointCode: z.string().nullable(),
  given: newCorrection.nullable(),
  values: z.object({
    unitNumber: z.number().int(),
    place: correctionPlace.nullable(),
    floor: z.string(),
    room: z.string(),
    text: z.string(),
    severity: z.enum(severities),
    section: z.string(),
  }),
});
const keptOutcome = z.object({
  version: z.literal(keptVersion),
  keptAt: z.iso.datetime(),
  draft: outcomeDraft,
  correction: typedCorrection.nullable(),
});
export type KeptOutcome = z.infer<typeof keptOutcome>;
export type TypedCorrection = z.infer<typeof typedCorrection>;

/** Whose draft of which visit: nobody else's is ever read on the same device. */
export interface DraftOwner {
  readonly personId: string;
  readonly visitId: string;
}

function keyOf({ personId, visitId }: DraftOwner): string {
  return `${keyStart}${personId}.${visitId}`;
}

/** What this person typed about this visit on this device and has not recorded; null for nothing, or for what cannot be read any more. */
export function findKeptOutcome(owner: DraftOwner): KeptOutcome | null {
  try {
    return parsed(window.localStorage.getItem(keyOf(owner)));
  } catch {
    return null;
  }
}

/** Keeps what is typed; an untouched draft keeps nothing. Where storage is blocked or full the page goes on without. */
export function keepOutcome(owner: DraftOwner, typed: Pick<KeptOutcome, 'draft' | 'correction'>, now: Date): void {
  if (typed.correction === null && isUntouched(typed.draft)) return dropKeptOutcome(owner);
  try {
    dropOld(now);
    const kept: KeptOutcome = { version: keptVersion, keptAt: now.toISOString(), ...typed };
    window.localStorage.setItem(keyOf(owner), JSON.stringify(kept));
  } catch {
    // Blocked or full: what is typed lives as long as the page.
  }
}

/** Recorded, or the visit has ended otherwise. */
export function dropKeptOutcome(owner: DraftOwner): void {
  try {
    window.localStorage.removeItem(keyOf(owner));
  } catch {
    // Blocked storage has nothing to let go.
  }
}

function isUntouched({ kind, notReady, noAccess, note, ...lists }: KeptOutcome['draft']): boolean {
  const hasReason = notReady !== null || noAccess !== null;
  return (
    kind === 'seen' && !hasReason && note === '' && Object.values(lists).every((one) => Object.keys(one).length === 0)
  );
}

function parsed(stored: string | null): KeptOutcome | null {
  if (stored === null) return null;
  const read: unknown = JSON.parse(stored);
  return keptOutcome.safeParse(read).data ?? null;
}

function dropOld(now: Date): void {
  const storage = window.localStorage;
  const keys = Array.from({ length: storage.length }, (_, index) => storage.key(index) ?? '');
  const oldest = now.getTime() - keptDays * 86_400_000;
  for (const key of keys.filter((one) => one.startsWith(keyStart))) {
    const kept = parsedOrNull(storage.getItem(key));
    if (kept === null || Date.parse(kept.keptAt) < oldest) storage.removeItem(key);
  }
}

function parsedOrNull(stored: string | null): KeptOutcome | null {
  try {
    return parsed(stored);
  } catch {
    return null;
  }
}
