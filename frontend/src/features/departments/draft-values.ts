import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';

/** A window as typed. */
export interface WindowDraft {
  readonly label: string;
  readonly start: string;
  readonly end: string;
  readonly days: readonly number[];
  readonly room: string;
}

/** What the desk changes here, as typed; the rest of the rule card stays as it is. */
export interface RuleCardDraft extends Record<string, unknown> {
  windows: readonly WindowDraft[];
  cutoff: string;
  workingDaysAhead: string;
  horizonWorkingDays: string;
  lotsPerRequest: string;
  booking: 'self' | 'desk';
}

export function draftOf({ asking }: RuleCardContent): RuleCardDraft {
  return {
    windows: asking.windows.map((window) => ({ ...window, room: String(window.room) })),
    cutoff: asking.cutoff,
    workingDaysAhead: String(asking.workingDaysAhead),
    horizonWorkingDays: String(asking.horizonWorkingDays),
    lotsPerRequest: String(asking.lotsPerRequest),
    booking: asking.booking,
  };
}

/** NaN for what is no number: the contract then names the fault. */
const typed = (text: string): number => (text.trim() === '' ? Number.NaN : Number(text));

/** The whole content as it would be saved. Windows for re-inspections that no longer exist go with their window. */
export function contentOf(content: RuleCardContent, draft: RuleCardDraft): RuleCardContent {
  const windows = draft.windows.map((window) => ({ ...window, days: [...window.days], room: typed(window.room) }));
  const labels = windows.map(({ label }) => label.trim());
  const kept = content.asking.reinspectionWindows?.filter((label) => labels.includes(label)) ?? null;
  return {
    ...content,
    asking: {
      ...content.asking,
      windows,
      cutoff: draft.cutoff,
      workingDaysAhead: typed(draft.workingDaysAhead),
      horizonWorkingDays: typed(draft.horizonWorkingDays),
      lotsPerRequest: typed(draft.lotsPerRequest),
      booking: draft.booking,
      reinspectionWindows: kept !== null && kept.length === 0 ? null : kept,
    },
  };
}
