import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import type { PlannedPart } from '../api/plan-offers';
import { planHistoryQuery } from '../api/plans';
import { useWayName } from '../way-name';

/** The plans before this one, read when they are asked for. */
export function PlanHistory({ lotId, part, zone }: { lotId: string; part: PlannedPart; zone: string }): ReactNode {
  const { t } = useTranslation('plans');
  const [isOpen, setOpen] = useState(false);
  const history = useQuery({ ...planHistoryQuery(lotId, part), enabled: isOpen });
  const words = useTimeWords();
  const nameOf = useWayName();
  return (
    <details className="plan-history" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>{t('history.title')}</summary>
      {isOpen ? (
        <QueryState query={history}>
          {({ items }) => {
            const before = items.filter(({ isCurrent }) => !isCurrent);
            if (before.length === 0) return <p className="s mid">{t('history.none')}</p>;
            return (
              <ul>
                {before.map((plan) => (
                  <li key={plan.id} className="spread">
                    <span>{t('history.line', { way: nameOf(plan), name: plan.chosenBy })}</span>
                    <span className="s mid">
                      <Numeral text={words.dayClock(plan.chosenAt, zone)} />
                    </span>
                  </li>
                ))}
              </ul>
            );
          }}
        </QueryState>
      ) : null}
    </details>
  );
}
