import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { useNow } from '../../../lib/clock';
import { minutesBetween } from '../../../lib/local-days';
import { useTimeWords } from '../../../lib/time';
import { useReadingWords } from '../reading-words';

/** What stands, since when, and what was last read: facts only, no forecast. */
export function StandingLine({ hold, zone }: { hold: Hold | null; zone: string }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const readingWords = useReadingWords();
  const now = useNow();
  if (hold === null) return <p className="standing-line none mid">{t('section.nothing')}</p>;
  const test = t('common.test', { ordinal: hold.ordinal });
  const system = t(`common.systems.${hold.system}`);
  const read = hold.readings.filter(({ isStruck }) => !isStruck).sort((a, b) => b.at.localeCompare(a.at))[0];
  const value = read === undefined ? null : readingWords.value(hold, read);
  const isStanding = hold.state === 'standing';
  const seen =
    read === undefined
      ? t('section.notRead')
      : t('section.lastRead', { value: value ?? '', time: words.dayClock(read.at, zone) });
  return (
    <div className={`standing-line ${isStanding ? 'wash-water' : 'wash-none'}`}>
      <Mark name={isStanding ? (hold.system === 'dwv' ? 'level' : 'ready') : 'test-ended'} size={24} />
      <div>
        <div className="b">
          <Numeral
            text={
              isStanding
                ? t('section.standing', { system, test, for: words.duration(minutesBetween(hold.startedAt, now)) })
                : t('section.ended', {
                    system,
                    test,
                    why: t(`endReasons.${hold.endReason ?? 'taken-down'}`),
                    time: hold.endedAt === null ? '' : words.dayClock(hold.endedAt, zone),
                  })
            }
          />
        </div>
        <div className="s mid">
          <Numeral text={seen} />
        </div>
      </div>
    </div>
  );
}
