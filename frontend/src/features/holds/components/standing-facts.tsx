import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Cell, Cells } from '../../../components/cells';
import { Measure, Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { useTimeWords } from '../../../lib/time';
import { measureWords, readLevel, readPressure } from '../../../lib/units';
import { instrumentOf, isLevelTest } from '../standing-tests';
import { StrikeReading, type StrikeReadingProps } from './strike-reading';

export interface StandingFactsProps {
  hold: Hold;
  name: string;
  zone: string | null;
  ruleCardVersion: number;
  abilities: StrikeReadingProps['abilities'];
}

/** The test that stands: how, since when, and its last readings. */
export function StandingFacts({ hold, name, zone, ruleCardVersion, abilities }: StandingFactsProps): ReactNode {
  const { t } = useTranslation(['holds', 'common']);
  const time = useTimeWords();
  const own = zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  const newest = [...hold.readings].sort((a, b) => Date.parse(b.at) - Date.parse(a.at)).slice(0, 5);
  const asks =
    hold.minimumPsi === null
      ? t('facts.level')
      : t('facts.minimum', { psi: hold.minimumPsi, version: ruleCardVersion });
  return (
    <Panel title={name} side={<span className="s mid">{t('facts.stands')}</span>} isFlush>
      <Cells columns={2}>
        <Cell label={t('setup.method')}>{t(`methods.${hold.method}`)}</Cell>
        <Cell label={t('setup.medium')}>{t(`media.${hold.medium}`)}</Cell>
        <Cell label={t('facts.since')}>
          <Numeral text={time.dayClock(hold.startedAt, own)} />
        </Cell>
        <Cell label={t('facts.asks', { version: ruleCardVersion })}>
          <Numeral text={asks} />
        </Cell>
        {isLevelTest(hold) || hold.ceilingPsi === null ? null : (
          <Cell label={t('setup.ceiling')}>
            <Measure value={hold.ceilingPsi} unit="psi" />
          </Cell>
        )}
      </Cells>
      <ol className="last-readings" aria-label={t('facts.readings')}>
        {newest.map((reading) => (
          <ReadingLine key={reading.id} hold={hold} reading={reading} zone={own} abilities={abilities} />
        ))}
      </ol>
    </Panel>
  );
}

interface ReadingLineProps extends Pick<StrikeReadingProps, 'hold' | 'reading' | 'abilities'> {
  zone: string;
}

function ReadingLine({ hold, reading, zone, abilities }: ReadingLineProps): ReactNode {
  const { t } = useTranslation('holds');
  const time = useTimeWords();
  const { increment } = instrumentOf(hold);
  const shown =
    reading.pressurePsi === null
      ? readLevel(reading.levelIn ?? 0, increment)
      : readPressure(reading.pressurePsi, increment);
  const at = time.dayClock(reading.at, zone);
  const valve = reading.gaugeValve === null ? '' : t(`facts.valve.${reading.gaugeValve}`);
  const isTheirs = reading.byRole === 'superintendent' || reading.byRole === 'inspector';
  return (
    <li className={reading.isStruck ? 'struck' : undefined}>
      <span className="n when">
        <Numeral text={at} />
      </span>
      <span className="b">
        <Measure value={shown.number} unit={shown.unit} />
      </span>
      <span className="mid grow">
        {[
          valve,
          isTheirs
            ? t('facts.byRole', { name: reading.byName, role: t(`facts.roles.${reading.byRole}`) })
            : reading.byName,
        ]
          .filter(Boolean)
          .join(', ')}
        {reading.isStruck ? `, ${t('facts.struck', { why: reading.struckWhy ?? '' })}` : ''}
      </span>
      <StrikeReading hold={hold} reading={reading} abilities={abilities} value={measureWords(shown)} at={at} />
    </li>
  );
}
