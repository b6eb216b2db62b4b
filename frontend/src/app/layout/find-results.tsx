import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import './find.css';

export interface Found {
  readonly id: string;
  readonly number: string;
  readonly tractName: string | null;
  readonly address: string;
  readonly permitNumber: string | null;
}

export interface FindResultsProps {
  id: string;
  found: readonly Found[];
  /** The one the arrow keys stand on. */
  at: number;
  isLoading: boolean;
  /** Why there is no answer. */
  failed: string | undefined;
  onOpen: (lot: Found) => void;
}

/** What the find box found, under it. */
export function FindResults({ id, found, at, isLoading, failed, onOpen }: FindResultsProps): ReactNode {
  const { t } = useTranslation('app');
  const said =
    failed ??
    (isLoading ? t('find.reading') : found.length === 0 ? t('find.none') : t('find.count', { count: found.length }));
  return (
    <div className="found floating">
      <p className={found.length > 0 && failed === undefined ? 'hidden-words' : 'found-said s mid'} role="status">
        {said}
      </p>
      <ul id={id} role="listbox" aria-label={t('find.results')}>
        {found.map((lot, index) => (
          <li
            key={lot.id}
            id={`${id}-${index}`}
            role="option"
            aria-selected={index === at}
            className="found-row"
            // The press must come before the focus leaves the field.
            onPointerDown={(event) => event.preventDefault()}
            onClick={() => onOpen(lot)}
          >
            <span className="n b">{lot.number}</span>
            <span className="grow">
              <span className="b">{lot.tractName ?? t('find.noTract')}</span>
              <span className="xs mid">{lot.address}</span>
            </span>
            {lot.permitNumber === null ? null : <span className="n xs mut">{lot.permitNumber}</span>}
          </li>
        ))}
      </ul>
    </div>
  );
}
