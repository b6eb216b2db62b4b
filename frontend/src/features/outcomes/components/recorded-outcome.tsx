import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Correction, Outcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Cell, Cells } from '../../../components/cells';
import { NoteLines } from '../../../components/note-lines';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { StateWord } from '../../../components/state-word';
import { localName, useLocale } from '../../../lib/i18n';
import { useTimeWords } from '../../../lib/time';
import { CorrectionRow } from './correction-row';

export interface RecordedOutcomeProps {
  visit: VisitSummary;
  outcome: Outcome;
  /** Opened on this visit. */
  corrections: readonly Correction[];
}

/** An outcome as it was recorded: it is never changed. */
export function RecordedOutcome({ visit, outcome, corrections }: RecordedOutcomeProps): ReactNode {
  const { t } = useTranslation(['outcomes', 'common', 'marks']);
  const time = useTimeWords();
  const locale = useLocale();
  const hasUnits = visit.unitNumbers.length > 1;
  const reason = outcome.reason === null ? null : t(`reasons.${outcome.reason}`);
  return (
    <>
      <div className="panel-body">
        <p className="h1 row">
          <StateWord state={outcome.kind} size={28} />
          {reason === null ? null : <span className="mid">{reason}</span>}
        </p>
        <p className="mid">
          <Numeral text={t('recorded.by', { name: outcome.byName, at: time.dayClock(outcome.at, visit.zone) })} />
        </p>
        {outcome.note === null ? null : <p className="words">{outcome.note}</p>}
      </div>
      {outcome.systems.length === 0 ? null : (
        <Cells columns={2}>
          {outcome.systems.map((system) => {
            const name = t(`common.systems.${system.system}`);
            const needle = system.needle === null ? null : t(`recorded.needle.${system.needle}`);
            const reads =
              system.pressurePsi !== null
                ? `${system.pressurePsi} psi`
                : system.levelIn !== null
                  ? t('recorded.level', { inches: system.levelIn })
                  : null;
            return (
              <Cell
                key={`${system.unitNumber}.${system.system}`}
                label={hasUnits ? t('subject.ofUnit', { system: name, unit: system.unitNumber }) : name}
              >
                <StateWord state={system.answer} />
                <div className="s mid">
                  <Numeral text={[reads, needle, system.note].filter(Boolean).join(', ')} />
                </div>
              </Cell>
            );
          })}
        </Cells>
      )}
      {outcome.work.length === 0 ? null : (
        <Panel title={t('work.title')} isFlush>
          <NoteLines
            label={t('work.title')}
            lines={outcome.work.map(({ pointCode, label, isLookedAt }) => {
              const own = corrections.find((one) => one.pointCode === pointCode);
              return {
                id: pointCode,
                text: localName(label, locale),
                isLookedAt,
                correction: own && { number: own.number, state: `correction-${own.state}` as const },
              };
            })}
          />
        </Panel>
      )}
      {corrections.length === 0 ? null : (
        <Panel title={t('recorded.corrections')} isFlush>
          <ul className="correction-list">
            {corrections.map((correction) => (
              <CorrectionRow key={correction.id} correction={correction} zone={visit.zone} hasLot={false} />
            ))}
          </ul>
        </Panel>
      )}
    </>
  );
}
