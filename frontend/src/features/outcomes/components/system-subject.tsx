import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Answers } from '../../../components/answers';
import { Choice } from '../../../components/choice';
import { Field } from '../../../components/field';
import { Mark, type MarkName } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { readPressure } from '../../../lib/units';
import { feetAbovePlug } from '../../holds/level-words';
import { instrumentOf, lastCounted } from '../../holds/standing-tests';
import { parseNumber } from '../../holds/typed-reading';
import { notUnderTest } from '../not-under-test';
import { needles, type Subject, type SystemDraft } from '../outcome-draft';
import { DraftCorrections } from './draft-corrections';

export interface SystemSubjectProps {
  subject: Subject;
  /** "DWV", or "DWV, unit 2". */
  name: string;
  /** "rule card 6: at least 100 psi" */
  asks: string;
  hold: Hold | null;
  house: HouseGeometry | null;
  zone: string;
  isLevel: boolean;
  draft: SystemDraft;
  onChange: (draft: SystemDraft) => void;
  corrections: readonly { readonly number: number; readonly correction: NewCorrection }[];
  onCorrect: (clientId: string | null) => void;
  /** What is wrong with the answer. */
  fault?: string;
}

/** DWV or water of one unit: the minimum first, what the needle did, what the gauge reads, then the answer. */
export function SystemSubject(props: SystemSubjectProps): ReactNode {
  const { subject, name, asks, hold, isLevel, draft, onChange, corrections, onCorrect, fault } = props;
  const { t } = useTranslation('outcomes');
  const id = `subject-${subject.unitNumber}-${subject.system}`;
  return (
    <section className="subject" aria-labelledby={id}>
      <div className="spread wrap">
        <h2 className="h2 row" id={id}>
          <Mark name={markOf(props)} size={28} />
          {name}
        </h2>
        <span className="s mid">
          <Numeral text={asks} />
        </span>
      </div>
      {hold === null ? <p className="s t-brass med">{t('subject.noTest')}</p> : null}
      {isLevel ? null : (
        <Choice
          label={t('subject.needle')}
          isLabelShown
          wide
          options={needles.map((value) => ({ value, label: t(`needles.${value}`) }))}
          value={draft.needle}
          onChange={(needle) => onChange({ ...draft, needle })}
        />
      )}
      <ReadingLine {...props} />
      <Answers label={name} value={draft.answer} onChange={(answer) => onChange({ ...draft, answer })} />
      {fault === undefined ? null : (
        <p className="field-error" role="alert">
          {fault}
        </p>
      )}
      <DraftCorrections corrections={corrections} onOpen={onCorrect} addWord={t('subject.correct')} />
      <Field
        label={t('subject.note')}
        isOptional
        maxLength={1000}
        value={draft.note}
        onChange={(event) => onChange({ ...draft, note: event.target.value })}
      />
      <NotUnderTestLine {...props} />
    </section>
  );
}

function markOf({ draft, isLevel }: SystemSubjectProps): MarkName {
  if (draft.answer !== null) return draft.answer;
  if (isLevel) return 'level';
  return draft.needle === 'jumped' ? 'test-gauge' : 'test-few';
}

/** Nothing of the plumber's is shown before the inspector has typed what the gauge reads. */
function ReadingLine({ hold, zone, isLevel, draft, onChange }: SystemSubjectProps): ReactNode {
  const { t } = useTranslation('outcomes');
  const time = useTimeWords();
  const isTyped = parseNumber(draft.reading) !== null;
  const last = hold === null ? null : lastCounted(hold);
  const isRange = hold?.gauge != null && (parseNumber(draft.reading) ?? 0) > hold.gauge.rangePsi;
  const theirs =
    hold === null || last === null || last.pressurePsi === null
      ? null
      : t('subject.theirs', {
          name: last.byName,
          psi: readPressure(last.pressurePsi, instrumentOf(hold).increment).number,
          at: time.dayClock(last.at, zone),
        });
  const needle = draft.needle === null ? null : t(`needleSays.${draft.needle}`);
  return (
    <div className="reads">
      <Field
        label={t(isLevel ? 'subject.level' : 'subject.reads')}
        unit={isLevel ? 'in' : 'psi'}
        isNumeral
        isEntry
        isOptional={isLevel}
        autoComplete="off"
        value={draft.reading}
        error={
          draft.reading.trim() !== '' && !isTyped
            ? t('subject.notANumber')
            : isRange
              ? t('subject.aboveRange', { range: hold?.gauge?.rangePsi ?? 0 })
              : undefined
        }
        onChange={(event) => onChange({ ...draft, reading: event.target.value })}
      />
      <p className="s mid grow">
        {isLevel ? null : isTyped ? <Numeral text={theirs ?? ''} /> : t('subject.theirsLater')} {needle}
      </p>
    </div>
  );
}

function NotUnderTestLine({ hold, house }: SystemSubjectProps): ReactNode {
  const { t } = useTranslation('outcomes');
  const dry = notUnderTest(hold, house);
  if (dry === null) return null;
  const above = (feet: number): string => (feetAbovePlug(feet, house) ?? feet).toFixed(1);
  const words = { from: above(dry.fromFt), to: above(dry.toFt) };
  return (
    <p className="row not-under-test">
      <span className="hatched swatch" aria-hidden="true" />
      <span>
        <b>{t('dry.head')}</b> <Numeral text={t(house?.plugs.length ? 'dry.abovePlug' : 'dry.aboveFloor', words)} />
        {dry.floors.length > 0 ? ` ${t('dry.floors', { floors: dry.floors.join(', ') })}` : null}
      </span>
    </p>
  );
}
