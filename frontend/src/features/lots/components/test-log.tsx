import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotAbilities } from '@holdwater/shared-types/lots/lot.contract.js';
import { Fragment, useMemo, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Icon } from '../../../components/icon';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { Plain } from '../../../components/plain';
import { useLocale } from '../../../lib/i18n';
import { useTimeWords } from '../../../lib/time';
import { useIsPhone } from '../../../lib/use-media';
import { StrikeReading } from '../../holds/components/strike-reading';
import { logFactsOf, type LogFact } from '../../holds/log-facts';
import type { FoundAnalysis } from '../../holds/use-test-analysis';
import { useReadingWords } from '../reading-words';
import { secondClock } from '../second-clock';
import type { LotAnalysis } from '../use-lot-analysis';
import { FactCells, FactLines } from './log-fact-cells';
import { LogVerdict } from './log-verdict';
import '../test-log.css';

export interface TestLogProps {
  lotId: string;
  /** The tests of one unit, stage and system, the newest first. */
  tests: readonly Hold[];
  systemWord: string;
  zone: string;
  canAddReading: boolean;
  canTest: boolean;
  /** What the reader may do to the readings themselves. */
  abilities: Pick<LotAbilities, 'canTest' | 'canAddReading'>;
  /** The newest test worked out; null where it cannot be. */
  analysis?: LotAnalysis | null;
}

/** The log of readings, test by test; a struck reading stays where it was, struck, with why. */
export function TestLog(props: TestLogProps): ReactNode {
  const { lotId, tests, systemWord, zone, canAddReading, canTest, abilities, analysis = null } = props;
  const { t } = useTranslation(['lots', 'common']);
  const [latest, ...older] = tests;
  const mayRead = canAddReading && latest?.state === 'standing';
  const act =
    mayRead || canTest ? (
      <Act size="sm" to={`/lots/${lotId}/test`}>
        {t(mayRead ? 'log.add' : 'log.start')}
      </Act>
    ) : null;
  if (latest === undefined) {
    return (
      <Panel title={t('log.title', { system: systemWord })}>
        <Plain kind="empty" level={3} title={t('log.emptyTitle')} acts={act}>
          {t('log.emptyText')}
        </Plain>
      </Panel>
    );
  }
  return (
    <Panel title={<TestTitle hold={latest} systemWord={systemWord} />} side={act} isFlush>
      {analysis === null ? null : <LogVerdict analysis={analysis} hold={latest} zone={zone} />}
      <LogTable hold={latest} zone={zone} abilities={abilities} found={analysis?.found} />
      {older.map((hold) => (
        <details key={hold.id} className="older-test">
          <summary>
            <TestTitle hold={hold} systemWord={systemWord} />
          </summary>
          <LogTable hold={hold} zone={zone} abilities={abilities} />
        </details>
      ))}
    </Panel>
  );
}

function TestTitle({ hold, systemWord }: { hold: Hold; systemWord: string }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const test = t('common.test', { ordinal: hold.ordinal });
  return <Numeral text={t(hold.ordinal > 1 ? 'log.retest' : 'log.test', { system: systemWord, test })} />;
}

interface OfTest extends Pick<TestLogProps, 'zone' | 'abilities'> {
  hold: Hold;
  found?: FoundAnalysis;
}

function LogTable({ hold, zone, abilities, found }: OfTest): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const readingWords = useReadingWords();
  const readings = [...hold.readings].sort((a, b) => b.at.localeCompare(a.at));
  const isPhone = useIsPhone();
  const facts = useMemo(() => (found === undefined ? null : logFactsOf(found)), [found]);
  const hasAir = hold.medium !== 'water';
  const columns = facts === null || isPhone ? [] : hasAir ? (['says', 'left'] as const) : (['since'] as const);
  const isLevel = readings.some(({ levelIn }) => levelIn !== null);
  const metric = readingWords.units === 'metric';
  const unit = isLevel ? t(metric ? 'log.cm' : 'log.in') : metric ? 'kPa' : 'psi';
  return (
    <table className="log-table">
      <thead>
        <tr>
          <th scope="col">{t('log.read')}</th>
          <th scope="col" className="num">
            {unit}
          </th>
          <th scope="col" className="num">
            {metric ? '°C' : '°F'}
          </th>
          <th scope="col">{isLevel ? t('log.note') : t('log.valve')}</th>
          {columns.map((column) => (
            <th key={column} scope="col">
              {t(`log.${column}`)}
            </th>
          ))}
          <th scope="col">{t('log.by')}</th>
        </tr>
      </thead>
      <tbody>
        {readings.map((reading, index) => {
          const day = words.day(reading.at, zone);
          const before = readings[index - 1];
          const isNewDay = before === undefined || words.day(before.at, zone) !== day;
          return (
            <Fragment key={reading.id}>
              {isNewDay ? (
                <tr className="day-row">
                  <th scope="colgroup" colSpan={5 + columns.length}>
                    {day}
                  </th>
                </tr>
              ) : null}
              <ReadingRow
                hold={hold}
                reading={reading}
                zone={zone}
                abilities={abilities}
                hasValve={!isLevel}
                found={found}
                fact={reading.isStruck ? undefined : facts?.get(Date.parse(reading.at))}
                columns={columns.length}
              />
            </Fragment>
          );
        })}
      </tbody>
    </table>
  );
}

interface ReadingRowProps extends OfTest {
  reading: Reading;
  hasValve: boolean;
  fact?: LogFact;
  /** Columns that say what the reading comes to; none on a phone, where a line does. */
  columns: number;
}

function ReadingRow(props: ReadingRowProps): ReactNode {
  const { hold, reading, zone, abilities, hasValve, found, fact, columns } = props;
  const locale = useLocale();
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const readingWords = useReadingWords();
  const isOver =
    hold.ceilingPsi !== null &&
    reading.pressurePsi !== null &&
    reading.pressurePsi > hold.ceilingPsi &&
    !reading.isStruck;
  const number = <span className="n b">{readingWords.measure(hold, reading)?.number ?? ''}</span>;
  const isGaugeOnly = reading.gaugeValve === 'shut';
  return (
    <tr className={reading.isStruck ? 'struck' : isGaugeOnly ? 'gauge-only' : undefined}>
      <td>
        <Numeral text={fact?.isToTheSecond ? secondClock(reading.at, zone, locale) : words.clock(reading.at, zone)} />
      </td>
      <td className={`num ${isOver ? 't-red' : ''}`}>{reading.isStruck ? <del>{number}</del> : number}</td>
      <td className="num n mid">{readingWords.temperature(reading)?.number ?? ''}</td>
      <td>
        {hasValve && reading.gaugeValve !== null ? (
          <span className="row">
            <Icon name={reading.gaugeValve === 'open' ? 'valve-open' : 'valve-shut'} size={18} />
            {t(`log.valves.${reading.gaugeValve}`)}
          </span>
        ) : null}
        {isGaugeOnly && columns === 0 ? <span className="s mut row">{t('log.gaugeOnly')}</span> : null}
        {fact === undefined || found === undefined ? null : (
          <FactLines fact={fact} found={found} isWhole={columns === 0} />
        )}
        {isOver ? <span className="s t-red row">{t('log.over')}</span> : null}
        {reading.note ? <span className="s mid row">{reading.note}</span> : null}
        {reading.isStruck ? (
          <span className="s t-red row">{t('log.struck', { why: reading.struckWhy ?? '' })}</span>
        ) : null}
      </td>
      {columns === 0 ? null : <FactCells fact={fact} found={found} columns={columns} />}
      <td className="mid">
        {reading.byName}
        {reading.byRole === 'plumber' ? null : <span className="s mut row">{t(`common.roles.${reading.byRole}`)}</span>}
        <StrikeReading
          hold={hold}
          reading={reading}
          abilities={abilities}
          value={readingWords.value(hold, reading) ?? ''}
          at={words.dayClock(reading.at, zone)}
        />
      </td>
    </tr>
  );
}
