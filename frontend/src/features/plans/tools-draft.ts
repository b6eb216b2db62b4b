import { planTools, type PlanTools, type PlanToolsGiven } from '@holdwater/shared-types/plans/plan-tools.js';

/** The tools as typed. */
export interface ToolsDraft {
  readonly rangePsi: string;
  readonly incrementPsi: string;
  readonly fillRateGpm: string;
  readonly waterTempF: string;
  readonly riserIn: string;
  readonly maxSectionFt: string;
  readonly airVolumeGal: string;
  readonly makersAllowAir: boolean;
}
export type ToolField = Exclude<keyof ToolsDraft, 'makersAllowAir'>;

const typed = (value: number | null): string => (value === null ? '' : String(value));

export function draftOfTools(tools: PlanTools): ToolsDraft {
  return {
    rangePsi: typed(tools.gauge.rangePsi),
    incrementPsi: typed(tools.gauge.incrementPsi),
    fillRateGpm: typed(tools.fillRateGpm),
    waterTempF: typed(tools.waterTempF),
    riserIn: typed(tools.riserIn),
    maxSectionFt: typed(tools.maxSectionFt),
    airVolumeGal: typed(tools.airVolumeGal),
    makersAllowAir: tools.makersAllowAir,
  };
}

const numberOf = (text: string): number | undefined =>
  text.trim() === '' ? undefined : Number(text.replace(',', '.'));

/** What is sent: a field left empty is the usual. What the form does not ask for stays as `kept` has it. */
export function givenOfDraft(draft: ToolsDraft, kept: PlanTools): PlanToolsGiven {
  const [rangePsi, incrementPsi] = [numberOf(draft.rangePsi), numberOf(draft.incrementPsi)];
  const isBare = rangePsi === undefined && incrementPsi === undefined;
  return {
    gauge: isBare ? undefined : { rangePsi: rangePsi ?? NaN, incrementPsi: incrementPsi ?? NaN },
    fillRateGpm: numberOf(draft.fillRateGpm),
    waterTempF: numberOf(draft.waterTempF),
    riserIn: numberOf(draft.riserIn),
    maxSectionFt: numberOf(draft.maxSectionFt),
    airVolumeGal: numberOf(draft.airVolumeGal),
    makersAllowAir: draft.makersAllowAir,
    airPsi: kept.airPsi,
    plugs: kept.plugs,
  };
}

export interface ReadTools {
  /** Null while something typed cannot be. */
  readonly tools: PlanTools | null;
  /** By field of the draft. */
  readonly faults: Readonly<Partial<Record<ToolField, string>>>;
}

/** Reads the draft by the contract's own rules. */
export function readDraft(draft: ToolsDraft, kept: PlanTools): ReadTools {
  const parsed = planTools.safeParse(givenOfDraft(draft, kept));
  if (parsed.success) return { tools: parsed.data, faults: {} };
  const named = parsed.error.issues.map(({ path, message }) => [path.at(-1) ?? '', message] as const);
  return { tools: null, faults: Object.fromEntries([...named].reverse()) };
}

const storageKey = 'holdwater.plan-tools';

/** The tools typed last on this device: the same ones go from lot to lot. */
export function keptTools(usual: PlanTools): PlanTools {
  try {
    const parsed = planTools.safeParse(JSON.parse(window.localStorage.getItem(storageKey) ?? '{}'));
    return parsed.success ? { ...parsed.data, plugs: null } : usual;
  } catch {
    return usual;
  }
}

export function keepTools(tools: PlanTools): void {
  try {
    window.localStorage.setItem(storageKey, JSON.stringify({ ...tools, plugs: null }));
  } catch {
    // Storage may be blocked: the tools are then typed again.
  }
}
