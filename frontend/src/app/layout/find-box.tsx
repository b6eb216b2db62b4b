import { searchLots } from '@holdwater/shared-types/lots/lot.contract.js';
import { keepPreviousData, queryOptions, useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useId, useRef, useState, type KeyboardEvent, type ReactNode, type RefObject } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Icon } from '../../components/icon';
import { call } from '../../lib/api';
import { useErrorWords } from '../../lib/errors';
import { queryKeys } from '../../lib/query-keys';
import { useShortcut } from '../../lib/shortcuts';
import { useDebounced } from '../../lib/use-debounced';
import { FindResults, type Found } from './find-results';

/** Lots of that number, permit or address. */
const searchQuery = (q: string) =>
  queryOptions({
    queryKey: [...queryKeys.search, q],
    queryFn: ({ signal }) => call(searchLots, { query: { q } }, { signal }),
  });

interface Finding {
  readonly found: readonly Found[];
  readonly isAsked: boolean;
  /** Whether what was found is of the words as they stand now, not of those a moment ago. */
  readonly isCurrent: boolean;
  readonly isLoading: boolean;
  readonly error: unknown;
}

function useFind(words: string): Finding {
  const asked = useDebounced(words.trim());
  const search = useQuery({ ...searchQuery(asked), enabled: asked !== '', placeholderData: keepPreviousData });
  const isAsked = words.trim() !== '';
  return {
    found: isAsked ? (search.data?.items ?? []) : [],
    isAsked,
    isCurrent: asked === words.trim() && search.data !== undefined && !search.isPlaceholderData,
    isLoading: search.isPending,
    error: search.error,
  };
}

/** Finds a lot by number, permit or address: a combo box, key `/`. */
export function FindBox({ onLeave, isPhone = false }: { onLeave?: () => void; isPhone?: boolean }): ReactNode {
  const { t } = useTranslation('app');
  const [words, setWords] = useState('');
  const [isOpen, setIsOpen] = useState(false);
  const [at, setAt] = useState(0);
  const input = useRef<HTMLInputElement>(null);
  const box = useRef<HTMLDivElement>(null);
  const navigate = useNavigate();
  const id = useId();
  const { found, isAsked, isCurrent, isLoading, error } = useFind(words);
  const queryClient = useQueryClient();
  const errorWords = useErrorWords(error);
  useShortcut('/', () => input.current?.focus());
  useLeave(box, () => setIsOpen(false));

  const open = (lot: Found | undefined): void => {
    if (lot === undefined) return;
    setWords('');
    setIsOpen(false);
    onLeave?.();
    void navigate(`/lots/${lot.id}`);
  };
  /** Enter before the answer is there: the first of what these words find, unless they have changed by then. */
  const openFirst = async (): Promise<void> => {
    const q = words.trim();
    if (q === '') return;
    const { items } = await queryClient.fetchQuery(searchQuery(q));
    if (input.current?.value.trim() === q) open(items[0]);
  };
  const press = (event: KeyboardEvent): void => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      setAt((now) => clamp(now + (event.key === 'ArrowDown' ? 1 : -1), found.length));
    } else if (event.key === 'Enter') {
      if (isCurrent) open(found[at]);
      // A failure is told by the list itself.
      else openFirst().catch(() => undefined);
    } else if (event.key === 'Escape') {
      setIsOpen(false);
      onLeave?.();
    }
  };
  const isShown = isOpen && isAsked;
  return (
    <div className={isPhone ? 'find-words phone' : 'cell find'} role="search" ref={box}>
      <div className="grow">
        {isPhone ? null : (
          <label className="lab" htmlFor={`${id}-find`}>
            {t('find.word')}
          </label>
        )}
        <input
          ref={input}
          id={`${id}-find`}
          type="search"
          role="combobox"
          autoComplete="off"
          autoFocus={isPhone}
          maxLength={100}
          placeholder={t('find.what')}
          aria-label={t('find.label')}
          aria-expanded={isShown}
          aria-controls={`${id}-found`}
          aria-autocomplete="list"
          aria-activedescendant={isShown && found[at] ? `${id}-found-${at}` : undefined}
          value={words}
          onChange={(event) => {
            setWords(event.target.value);
            setAt(0);
            setIsOpen(true);
          }}
          onFocus={() => setIsOpen(true)}
          onKeyDown={press}
        />
      </div>
      {isPhone ? null : <Icon name="find" size={18} />}
      {isShown ? (
        <FindResults
          id={`${id}-found`}
          found={found}
          at={at}
          isLoading={isLoading}
          failed={errorWords?.title}
          onOpen={open}
        />
      ) : null}
    </div>
  );
}

function clamp(index: number, length: number): number {
  return Math.max(0, Math.min(index, length - 1));
}

/** Closes the results when the focus or a press goes elsewhere. */
function useLeave(box: RefObject<HTMLElement | null>, onLeave: () => void): void {
  const latest = useRef(onLeave);
  useEffect(() => {
    latest.current = onLeave;
  });
  useEffect(() => {
    const look = (event: Event): void => {
      if (event.target instanceof Node && !box.current?.contains(event.target)) latest.current();
    };
    document.addEventListener('pointerdown', look);
    document.addEventListener('focusin', look);
    return () => {
      document.removeEventListener('pointerdown', look);
      document.removeEventListener('focusin', look);
    };
  }, [box]);
}
