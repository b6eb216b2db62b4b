import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotAbilities } from '@holdwater/shared-types/lots/lot.contract.js';
import { Fragment, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Icon } from '../../../components/icon';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { Plain } from '../../../components/plain';
import { useTimeWords } from '../../../lib/time';
import { StrikeReading } from '../../holds/components/strike-reading';
import { useReadingWords } from '../reading-words';
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
}

/** The log of readings, test by test; a struck reading stays where it was, struck, with why. */
export function TestLog(props: TestLogProps): ReactNode {
  const { lotId, tests, systemWord, zone, canAddReading, canTest, abilities } = props;
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
      <LogTable hold={latest} zone={zone} abilities={abilities} />
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
}

function LogTable({ hold, zone, abilities }: OfTest): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const readingWords = useReadingWords();
  const readings = [...hold.readings].sort((a, b) => b.at.localeCompare(a.at));
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
                  <th scope="colgroup" colSpan={5}>
                    {day}
                  </th>
                </tr>
              ) : null}
              <ReadingRow hold={hold} reading={reading} zone={zone} abilities={abilities} hasValve={!isLevel} />
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
}

function ReadingRow({ hold, reading, zone, abilities, hasValve }: ReadingRowProps): ReactNode {
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
        <Numeral text={words.clock(reading.at, zone)} />
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
        {isGaugeOnly ? <span className="s mut row">{t('log.gaugeOnly')}</span> : null}
        {isOver ? <span className="s t-red row">{t('log.over')}</span> : null}
        {reading.note ? <span className="s mid row">{reading.note}</span> : null}
        {reading.isStruck ? (
          <span className="s t-red row">{t('log.struck', { why: reading.struckWhy ?? '' })}</span>
        ) : null}
      </td>
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
