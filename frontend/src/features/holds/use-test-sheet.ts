import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { sayDone } from '../../components/done-line';
import { useNow } from '../../lib/clock';
import { isApiError } from '../../lib/api-error';
import { useAddReading } from './api/add-reading';
import { useSayTestUp } from './api/say-test-up';
import { useStartHold } from './api/start-hold';
import { keepTools, readTools } from './kept-tools';
import { withTyped } from './shown-test';
import { instrumentOf, lastReading, type TestedPart } from './standing-tests';
import { firstSetup, instrumentOfSetup, newHoldOf, setupFaults, type SetupDraft } from './test-setup';
import { checkReading, emptyReading, type ReadingDraft, type TypedReading } from './typed-reading';
import { whyNotUp, type WhyNotUp } from './up-act';
import { useKeptTemperatures } from './use-kept-temperatures';
import { useTestAnalysis } from './use-test-analysis';
import { verdictKind } from './verdict';

export interface TestSheetInput {
  readonly lot: LotDetail;
  readonly holds: readonly Hold[];
  readonly visit: VisitSummary | null;
  readonly ruleCard: RuleCard;
  readonly rule: TestRule;
  readonly part: TestedPart;
  /** The test that stands; null where one is to be started. */
  readonly hold: Hold | null;
}

/** What is typed on the sheet of one test, what it comes to, and the acts that send it. */
export function useTestSheet(input: TestSheetInput) {
  const { lot, holds, visit, rule, part, hold } = input;
  const house = lot.units.find(({ number }) => number === part.unitNumber)?.geometry ?? null;
  const earlier = holds.find((one) => one.unitNumber === part.unitNumber && one.system === part.system) ?? null;
  const [setup, setSetup] = useState<SetupDraft>(() => firstSetup(rule, house, earlier, readTools()));
  const [ownDraft, setDraft] = useState<ReadingDraft>(emptyReading);
  const [temperatures, setTemperatures] = useKeptTemperatures(lot);
  const [isTried, setIsTried] = useState(false);
  const instrument = hold === null ? instrumentOfSetup(setup, rule) : instrumentOf(hold);
  const medium = hold === null ? setup.medium : hold.medium;
  const draft = instrument.isLevel ? ownDraft : { ...ownDraft, temperatureF: temperatures.now };
  const check = checkReading(draft, instrument);
  const missing = hold === null ? setupFaults(setup, rule) : {};
  const isUntyped = draft.value.trim() === '';
  const isValveShut = !instrument.isLevel && (draft.valve === 'shut' || (isUntyped && isLastShut(hold)));
  const why = whyNotUp({
    visit,
    stageCode: rule.stageCode,
    holds,
    part,
    hold,
    check,
    isUntyped,
    minimumPsi: instrument.minimumPsi,
    isValveShut: draft.valve === 'shut',
  });
  const shown = withTyped(input, { setup, instrument, reading: check.reading, now: useNow() });
  const found = useTestAnalysis({ lot, test: shown, visit, rule, temperatures });
  const isOverLimit = check.isOverLimit || (isUntyped && found !== null && verdictKind(found.analysis) === 'over');
  const mayStart = lot.abilities.canTest;
  const maySave = hold === null ? mayStart : lot.abilities.canAddReading;
  const maySayUp = lot.abilities.canSayTestUp && visit?.state !== 'ready';
  const sending = useSending(input, { setup, draft, setDraft, reading: check.reading, why, isUntyped });
  return {
    house,
    setup,
    setSetup,
    draft,
    setDraft,
    check,
    instrument,
    medium,
    temperatures,
    setTemperatures,
    /** What stands and what is typed, worked out; the inspector sees it once a reading is typed. */
    found: lot.abilities.canDecide && check.reading === null ? null : found,
    isOverLimit,
    isUntyped,
    isValveShut,
    maySave,
    up: maySayUp ? { why, isTyped: !isUntyped || hold === null } : null,
    setupFaults: isTried ? missing : {},
    hasSetupFaults: Object.keys(missing).length > 0,
    /** Marks what is missing of the set-up; true when nothing is. */
    trySetup: (): boolean => {
      setIsTried(true);
      return Object.keys(missing).length === 0;
    },
    ...sending,
  };
}
export type TestSheetState = ReturnType<typeof useTestSheet>;

function isLastShut(hold: Hold | null): boolean {
  return hold !== null && lastReading(hold)?.gaugeValve === 'shut';
}

interface Typed {
  readonly setup: SetupDraft;
  readonly draft: ReadingDraft;
  readonly setDraft: (draft: ReadingDraft) => void;
  readonly reading: TypedReading | null;
  readonly why: WhyNotUp | null;
  readonly isUntyped: boolean;
}

function useSending({ lot, visit, rule, part, hold }: TestSheetInput, typed: Typed) {
  const { t } = useTranslation('holds');
  const starting = useStartHold(lot.id);
  const adding = useAddReading(lot.id);
  const saying = useSayTestUp(lot.id);
  const [busy, setBusy] = useState<'up' | 'save' | null>(null);
  const { reading, setup, setDraft, isUntyped } = typed;

  const say = async (withReading: boolean): Promise<void> => {
    if (visit === null) return;
    const given = withReading && hold !== null && reading !== null ? { holdId: hold.id, reading } : undefined;
    await saying.mutateAsync({ visitId: visit.id, expectedVersion: visit.version, reading: given });
    setDraft(emptyReading);
    sayDone({
      mark: 'ready',
      title: t('done.up', { lot: lot.number }),
      text: t('done.upTold', { builder: visit.builderName }),
    });
  };
  const save = async (): Promise<void> => {
    if (reading === null) return;
    if (hold === null) {
      await starting.mutateAsync(newHoldOf(setup, rule, part, reading));
      keepTools(setup);
    } else {
      await adding.mutateAsync({ holdId: hold.id, reading });
    }
    setDraft(emptyReading);
    if (hold === null) sayDone({ mark: 'under-test', title: t('done.started') });
    else sayDone({ mark: 'test-few', title: t('done.saved') });
  };
  const run = async (which: 'up' | 'save', act: () => Promise<void>): Promise<void> => {
    if (busy !== null) return;
    [starting, adding, saying].forEach((one) => one.reset());
    setBusy(which);
    try {
      await act();
    } catch (error) {
      // Told where it belongs: by the mutation's own error, on the page.
      if (!isApiError(error)) throw error;
    } finally {
      setBusy(null);
    }
  };
  return {
    busy,
    error: saying.error ?? adding.error ?? starting.error,
    save: () => void run('save', save),
    sayUp: () =>
      void run('up', async () => {
        // A first reading goes with its test, so that the two are one entry.
        if (hold === null) await save();
        await say(!isUntyped);
      }),
  };
}
