import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark, type MarkName } from '../../../components/mark';
import type { ClearState } from '@holdwater/shared-types/clearances/clearance.rules.js';
import { filterCounts, type LotFilter, type LotRow } from '../lots-model';

export interface FilterChipsProps {
  rows: readonly LotRow[];
  filter: LotFilter;
  onChange: (filter: LotFilter) => void;
}

/** The filters that would show something, with how much; pressing the one that is on takes it off. */
export function FilterChips({ rows, filter, onChange }: FilterChipsProps): ReactNode {
  const { t } = useTranslation(['lots', 'marks']);
  const word = (one: LotFilter): string => {
    if (one === 'you') return t('marks.waits-on-you');
    return one.startsWith('on:') ? t('filters.on', { name: one.slice(3) }) : t(`marks.${one}`);
  };
  const mark = (one: LotFilter): MarkName => {
    if (one === 'you') return 'waits-on-you';
    return one.startsWith('on:') ? 'waits-on' : (one as ClearState);
  };
  return (
    <div className="chips" role="group" aria-label={t('filters.name')}>
      {filterCounts(rows).map(({ filter: one, count }) => (
        <button
          key={one}
          type="button"
          className={`chip ${one === filter ? 'on' : ''}`}
          aria-pressed={one === filter}
          onClick={() => onChange(one === filter ? 'open' : one)}
        >
          <Mark name={mark(one)} />
          <span>
            {word(one)} <span className="n">{count}</span>
          </span>
        </button>
      ))}
    </div>
  );
}
