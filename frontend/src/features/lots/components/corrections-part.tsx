import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';

export interface CorrectionsPartProps {
  query: Pick<UseQueryResult<{ items: Correction[] }>, 'data' | 'error' | 'isPending' | 'refetch'>;
  zone: string;
}

const order: Record<Correction['state'], number> = { open: 0, fixed: 1, accepted: 2 };

/** The corrections of the lot with their marks and states, the open ones first. */
export function CorrectionsPart({ query, zone }: CorrectionsPartProps): ReactNode {
  const { t } = useTranslation('lots');
  const items = query.data?.items ?? [];
  const mayAct = items.some(({ abilities }) => abilities.canFix || abilities.canDecide);
  return (
    <Panel
      title={t('corrections.title')}
      side={
        mayAct ? (
          <Act size="sm" to="/corrections">
            {t('corrections.act')}
          </Act>
        ) : null
      }
      isFlush
    >
      <QueryState query={query}>
        {({ items: known }) =>
          known.length === 0 ? (
            <p className="mid part-words">{t('corrections.none')}</p>
          ) : (
            <ul className="part-list">
              {[...known]
                .sort((a, b) => order[a.state] - order[b.state] || a.number - b.number)
                .map((one) => (
                  <OneCorrection key={one.id} one={one} zone={zone} />
                ))}
            </ul>
          )
        }
      </QueryState>
    </Panel>
  );
}

function OneCorrection({ one, zone }: { one: Correction; zone: string }): ReactNode {
  const { t } = useTranslation(['lots', 'departments', 'marks', 'common']);
  const words = useTimeWords();
  const where = [
    one.place === 'whole-system' ? t('corrections.wholeSystem') : null,
    one.floor,
    one.room,
    one.subject === 'work' ? t('corrections.work') : t(`common.systems.${one.subject}`),
  ].filter((part) => part !== null);
  const who =
    one.state === 'accepted'
      ? t('corrections.acceptedBy', {
          name: one.acceptedBy ?? '',
          day: one.acceptedAt === null ? '' : words.day(one.acceptedAt, zone),
        })
      : one.state === 'fixed'
        ? t('corrections.fixedBy', {
            name: one.fixedBy ?? '',
            day: one.fixedAt === null ? '' : words.day(one.fixedAt, zone),
          })
        : t('corrections.openedBy', { name: one.openedBy, day: words.day(one.openedAt, zone) });
  const tone = { open: 't-red', fixed: 't-brass', accepted: 't-green' }[one.state];
  return (
    <li className="row at-top">
      <Mark name={`correction-${one.state}`} number={one.number} size={28} />
      <div className="grow">
        <div className="b">
          <span className="hidden-words">{t('corrections.number', { number: one.number })}</span> {one.text}
        </div>
        <div className="s mid">
          {where.join(', ')}
          {one.section === null ? null : (
            <>
              . <Numeral text={t('corrections.section', { section: one.section })} />
            </>
          )}
        </div>
        <div className="s">
          <span className={`b ${tone}`}>{t(`marks.correction-${one.state}`)}</span>
          {', '}
          <span className="mid">{t(`departments.severities.${one.severity}`)}. </span>
          <span className="mid">{who}</span>
        </div>
        {one.state === 'fixed' && one.fixNote ? <div className="s mid">{one.fixNote}</div> : null}
        {one.state === 'open' && one.reopenedWhy ? (
          <div className="s t-red">{t('corrections.reopened', { why: one.reopenedWhy })}</div>
        ) : null}
      </div>
    </li>
  );
}
