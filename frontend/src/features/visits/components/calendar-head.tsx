import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Head } from '../../../components/head';
import { Mark, type MarkName } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { calendarViews, type CalendarView } from '../calendar-address';
import '../calendar-head.css';

export interface CalendarHeadProps {
  range: string;
  zoneWords: string;
  tracts: readonly string[];
  tract: string | null;
  onTract: (tract: string | null) => void;
  view: CalendarView;
  onView: (view: CalendarView) => void;
  /** Without it nobody can ask from here, or it is open. */
  onRequest?: () => void;
  isNarrow: boolean;
}

const legend = [
  ['booked', 'word.notUp'],
  ['part-up', 'word.partUp'],
  ['ready', 'word.up'],
  ['requested', 'word.requested'],
] as const satisfies readonly (readonly [MarkName, string])[];

/** The head of the calendar: what it covers, its zone, whose lots, what the marks mean, and how it is shown. */
export function CalendarHead(props: CalendarHeadProps): ReactNode {
  const { t } = useTranslation('visits');
  const cells = [{ label: t('cal.zone'), value: props.zoneWords }];
  return (
    <Head
      label={t('cal.label')}
      title={<Numeral text={props.range} />}
      cells={[
        ...cells,
        ...(props.tracts.length > 1 ? [{ label: t('cal.tracts'), value: <TractSelect {...props} /> }] : []),
        ...(props.isNarrow ? [] : [{ label: t('cal.legend'), value: <Legend /> }]),
      ]}
      acts={
        <>
          <Choice
            label={t('cal.view')}
            options={calendarViews.map((view) => ({ value: view, label: t(`cal.views.${view}`) }))}
            value={props.view}
            onChange={props.onView}
          />
          {props.onRequest === undefined ? null : (
            <Act kind="first" onClick={props.onRequest}>
              {t('req.title')}
            </Act>
          )}
        </>
      }
    />
  );
}

function TractSelect({ tracts, tract, onTract }: CalendarHeadProps): ReactNode {
  const { t } = useTranslation('visits');
  return (
    <select
      className="bare-select"
      aria-label={t('cal.tracts')}
      value={tract ?? ''}
      onChange={(event) => onTract(event.target.value === '' ? null : event.target.value)}
    >
      <option value="">{t('cal.allTracts')}</option>
      {tracts.map((name) => (
        <option key={name} value={name}>
          {name}
        </option>
      ))}
    </select>
  );
}

function Legend(): ReactNode {
  const { t } = useTranslation('visits');
  return (
    <span className="legend s">
      {legend.map(([mark, word]) => (
        <span key={mark}>
          <Mark name={mark} size={16} /> {t(word)}
        </span>
      ))}
    </span>
  );
}
