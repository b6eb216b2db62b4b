import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { TaskFoot } from '../../../components/task-head';
import { Panel } from '../../../components/panel';
import { Plain } from '../../../components/plain';
import { Failed } from '../../../lib/query-state';
import { useNow } from '../../../lib/clock';
import { lastCounted } from '../standing-tests';
import { ownLevelFt } from '../test-setup';
import { parseNumber } from '../typed-reading';
import { useTestSheet, type TestSheetInput, type TestSheetState } from '../use-test-sheet';
import { useVerdictWords, type VerdictWords } from '../use-verdict-words';
import { verdictMeasures } from '../verdict-measures';
import { EndTest } from './end-test';
import { LevelPicture } from './level-picture';
import { NoLongerUp } from './no-longer-up';
import { ReadingEntry } from './reading-entry';
import { ShortQuestion } from './short-question';
import { StandingFacts } from './standing-facts';
import { TemperatureFields } from './temperature-fields';
import { TestAnswer } from './test-answer';
import { TestActs } from './test-acts';
import { TestCautions } from './test-cautions';
import { TestSetupForm } from './test-setup-form';

/** One system of one unit: put it up, read it, say it is up. */
export function TestSheet(input: TestSheetInput): ReactNode {
  const { lot, visit, ruleCard, rule, part, hold } = input;
  const { t } = useTranslation(['holds', 'common']);
  const sheet = useTestSheet(input);
  const words = useSheetWords(input, sheet);
  const [isAsking, setIsAsking] = useState(false);
  const cannotSave = useCannotSave(sheet);
  const nextOrdinal = ordinalAfter(input);
  const name = t('testName', {
    system: t(`common.systems.${part.system}`),
    test: t('common.test', { ordinal: hold?.ordinal ?? nextOrdinal }),
  });
  if (!sheet.maySave) return <NotYours isStanding={hold !== null} name={name} />;
  const cautions = (
    <TestCautions
      system={part.system}
      medium={sheet.medium}
      instrument={sheet.instrument}
      isValveShut={sheet.isValveShut}
      isOverLimit={sheet.isOverLimit}
    />
  );
  const reading = (
    <div>
      {hold !== null || sheet.setup.medium !== null ? (
        <Panel title={t('reading.title')}>
          <Entry input={input} sheet={sheet} />
        </Panel>
      ) : null}
      {sheet.isOverLimit || words === null || sheet.found === null ? null : (
        <TestAnswer found={sheet.found} words={words} zone={zoneOf(input)} isValveShut={sheet.isValveShut} />
      )}
      {sheet.isOverLimit ? null : <div className="panel-body">{cautions}</div>}
    </div>
  );
  return (
    <>
      {sheet.isOverLimit ? cautions : null}
      <div className="test-sheet">
        {hold === null ? (
          <>
            <TestSetupForm
              rule={rule}
              ruleCard={ruleCard}
              house={sheet.house}
              title={name}
              draft={sheet.setup}
              faults={sheet.setupFaults}
              onChange={sheet.setSetup}
            />
            {reading}
          </>
        ) : (
          <>
            {reading}
            <div>
              <StandingFacts
                hold={hold}
                name={name}
                zone={lot.zone}
                ruleCardVersion={ruleCard.version}
                abilities={lot.abilities}
              />
              {lot.abilities.canTest ? (
                <div className="panel-body">
                  <EndTest lotId={lot.id} hold={hold} name={name} isUp={visit?.state === 'ready'} />
                </div>
              ) : null}
            </div>
          </>
        )}
      </div>
      {sheet.error === null ? null : <Failed error={sheet.error} level={2} />}
      {words === null ? null : (
        <ShortQuestion
          isOpen={isAsking}
          words={words}
          onKeep={() => setIsAsking(false)}
          onUp={() => {
            setIsAsking(false);
            sheet.sayUp();
          }}
        />
      )}
      <TaskFoot>
        {visit?.moves.includes('no-longer-up') ? <NoLongerUp visit={visit} /> : null}
        <TestActs
          up={sheet.up}
          cannotSave={cannotSave}
          isStarting={hold === null}
          busy={sheet.busy}
          onSave={() => (sheet.trySetup() ? sheet.save() : undefined)}
          onUp={() => {
            if (!sheet.trySetup()) return;
            if (words?.kind === 'short') setIsAsking(true);
            else sheet.sayUp();
          }}
        />
      </TaskFoot>
    </>
  );
}

const zoneOf = ({ lot, visit }: TestSheetInput): string =>
  visit?.zone ?? lot.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;

function useSheetWords(input: TestSheetInput, { found }: TestSheetState): VerdictWords | null {
  const wordsOf = useVerdictWords();
  const now = useNow();
  return found === null ? null : wordsOf({ ...found, zone: zoneOf(input), units: 'us', now });
}

/** Where the needle is expected at the window, in whole marks, and what to pump to. */
function expectedOf({ found, isOverLimit }: TestSheetState): { atWindow: number; pumpTo: number | null } | null {
  const forecast = found?.analysis.forecast ?? null;
  if (found === null || forecast === null || isOverLimit) return null;
  const { number } = verdictMeasures(found.analysis, 'us').worked(forecast.from.mid);
  return { atWindow: Number(number), pumpTo: forecast.topUpTo };
}

function ordinalAfter({ holds, part, rule }: TestSheetInput): number {
  const own = holds.filter(
    (one) => one.unitNumber === part.unitNumber && one.system === part.system && one.stageCode === rule.stageCode,
  );
  return Math.max(0, ...own.map(({ ordinal }) => ordinal)) + 1;
}

/** Why the reading cannot be saved yet. A set-up with holes can be pressed: it then shows where they are. */
function useCannotSave({ isUntyped, check, medium }: TestSheetState): string | null {
  const { t } = useTranslation('holds');
  if (medium === null) return t('why.no-method');
  if (isUntyped) return t('why.no-reading');
  if (check.faults.valve !== undefined) return t('why.valve-missing');
  return check.reading === null ? t('why.fault') : null;
}

function NotYours({ isStanding, name }: { isStanding: boolean; name: string }): ReactNode {
  const { t } = useTranslation('holds');
  const which = isStanding ? 'notYours' : 'noTest';
  return (
    <Plain kind="empty" title={t(`${which}.title`, { name })}>
      {t(`${which}.text`)}
    </Plain>
  );
}

function Entry({ input, sheet }: { input: TestSheetInput; sheet: TestSheetState }): ReactNode {
  const { hold, lot } = input;
  const { t } = useTranslation('holds');
  const { instrument } = sheet;
  const counted = hold === null ? null : lastCounted(hold);
  const last = instrument.isLevel ? counted?.levelIn : counted?.pressurePsi;
  const method = hold?.method ?? sheet.setup.method;
  const level = hold === null ? parseNumber(sheet.setup.fillLevelFt) : hold.fillLevelFt;
  return (
    <ReadingEntry
      instrument={instrument}
      draft={sheet.draft}
      check={sheet.check}
      stepFrom={last ?? instrument.minimumPsi ?? 0}
      picture={
        <LevelPicture house={sheet.house} method={method} fillLevelFt={level ?? ownLevelFt(method, sheet.house)} />
      }
      temperatures={
        <TemperatureFields
          typed={sheet.temperatures}
          place={lot.tract?.name ?? t('air.thisLot')}
          onChange={sheet.setTemperatures}
        />
      }
      expected={expectedOf(sheet)}
      onChange={sheet.setDraft}
    />
  );
}
