import { useId, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Field } from '../../../components/field';
import { Numeral } from '../../../components/numeral';
import { Dial } from '../../../drawings/dial';
import { useIsPhone } from '../../../lib/use-media';
import { parseNumber, stepValue, type Instrument, type ReadingCheck, type ReadingDraft } from '../typed-reading';
import { useFaultWords } from '../use-fault-words';

export interface ReadingEntryProps {
  instrument: Instrument;
  draft: ReadingDraft;
  check: ReadingCheck;
  /** Where the steppers start while nothing is typed. */
  stepFrom: number;
  /** The picture over the entry of a level. */
  picture: ReactNode;
  /** The air temperatures of a test at a gauge. */
  temperatures: ReactNode;
  /** What the needle is expected to show at the window, and what to pump to, psi. */
  expected: { readonly atWindow: number; readonly pumpTo: number | null } | null;
  onChange: (draft: ReadingDraft) => void;
}

/** A reading as it is typed: the dial follows, steppers go half a mark. */
export function ReadingEntry(props: ReadingEntryProps): ReactNode {
  const { instrument, draft, check, picture, temperatures, onChange } = props;
  const { t } = useTranslation('holds');
  const words = useFaultWords();
  return (
    <div className="reading-entry">
      {instrument.isLevel ? picture : <DialAndValve {...props} />}
      <ValueEntry {...props} />
      {instrument.isLevel ? null : temperatures}
      <div className={instrument.isLevel ? 'fields two' : 'fields'}>
        {instrument.isLevel ? (
          <Field
            label={t('reading.temperature.water')}
            labelPlace="inside"
            unit="°F"
            isNumeral
            isOptional
            autoComplete="off"
            value={draft.temperatureF}
            error={words(check.faults.temperatureF)}
            onChange={(event) => onChange({ ...draft, temperatureF: event.target.value })}
          />
        ) : null}
        <Field
          label={t('reading.note')}
          labelPlace="inside"
          isOptional
          maxLength={500}
          autoComplete="off"
          value={draft.note}
          onChange={(event) => onChange({ ...draft, note: event.target.value })}
        />
      </div>
    </div>
  );
}

function DialAndValve({ instrument, draft, expected, onChange }: ReadingEntryProps): ReactNode {
  const { t } = useTranslation('holds');
  const isPhone = useIsPhone();
  const typed = parseNumber(draft.value);
  const { rangePsi, increment, minimumPsi, ceilingPsi } = instrument;
  return (
    <div className="dial-and-valve">
      {rangePsi === null ? (
        <p className="s mid no-dial">{t('reading.noDial')}</p>
      ) : (
        <Dial
          max={rangePsi}
          unit="psi"
          increment={increment}
          value={typed === null || typed > rangePsi ? null : typed}
          minimum={minimumPsi ?? 0}
          limit={ceilingPsi}
          ghost={expected?.atWindow ?? null}
          pumpTo={expected?.pumpTo ?? null}
          size={isPhone ? 180 : 220}
        />
      )}
      <div className="beside">
        <Choice
          label={t('reading.valve')}
          isLabelShown
          stacked
          wide
          size="lg"
          options={[
            { value: 'open', label: t('reading.open'), icon: 'valve-open' },
            { value: 'shut', label: t('reading.shut'), icon: 'valve-shut' },
          ]}
          value={draft.valve}
          onChange={(valve) => onChange({ ...draft, valve })}
        />
        {rangePsi === null ? null : (
          <p className="s mid">
            <Numeral text={t('reading.gauge', { range: rangePsi, increment })} />
          </p>
        )}
      </div>
    </div>
  );
}

function ValueEntry({ instrument, draft, check, stepFrom, onChange }: ReadingEntryProps): ReactNode {
  const { t } = useTranslation('holds');
  const words = useFaultWords();
  const id = useId();
  const unit = instrument.isLevel ? 'in' : 'psi';
  const step = (steps: 1 | -1): void =>
    onChange({ ...draft, value: stepValue(draft.value, steps, instrument.increment, stepFrom) });
  const { meant } = check;
  return (
    <div className="value-entry">
      <button type="button" className="btn stepper" aria-controls={id} onClick={() => step(-1)}>
        <span aria-hidden="true">−½</span>
        <span className="hidden-words">{t('reading.stepDown')}</span>
      </button>
      <Field
        id={id}
        label={t(instrument.isLevel ? 'reading.level' : 'reading.pressure')}
        unit={unit}
        isNumeral
        isEntry
        autoComplete="off"
        value={draft.value}
        error={
          check.faults.value === 'above-gauge-range'
            ? t('reading.aboveRange', { range: instrument.rangePsi ?? 0 })
            : words(check.faults.value)
        }
        fix={
          meant === null
            ? undefined
            : {
                word: t('reading.useMeant', { meant }),
                onUse: () => onChange({ ...draft, value: String(meant) }),
              }
        }
        onChange={(event) => onChange({ ...draft, value: event.target.value })}
      />
      <button type="button" className="btn stepper" aria-controls={id} onClick={() => step(1)}>
        <span aria-hidden="true">+½</span>
        <span className="hidden-words">{t('reading.stepUp')}</span>
      </button>
    </div>
  );
}
