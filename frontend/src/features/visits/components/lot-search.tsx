import { useQuery } from '@tanstack/react-query';
import { useRef, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useWaiting } from '../../../app/layout/counts';
import { Field } from '../../../components/field';
import { Icon } from '../../../components/icon';
import { Numeral } from '../../../components/numeral';
import { useErrorWords } from '../../../lib/errors';
import { useDebounced } from '../../../lib/use-debounced';
import { searchLotsQuery } from '../api/search-lots';
import '../request.css';

export interface LotSearchProps {
  chosen: readonly string[];
  onAdd: (lotId: string) => void;
}

/** At most so many lots without a window are offered before anything is typed. */
const suggestedCount = 8;

/** Adds lots to a request: those that wait for a window at one press, any other by number, permit or address. */
export function LotSearch({ chosen, onAdd }: LotSearchProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const [typed, setTyped] = useState('');
  const input = useRef<HTMLInputElement>(null);
  const asked = useDebounced(typed.trim());
  const search = useQuery(searchLotsQuery(asked));
  const words = useErrorWords(search.error);
  const found = typed.trim() === '' ? [] : (search.data?.items ?? []).filter(({ id }) => !chosen.includes(id));
  const isNone = asked !== '' && asked === typed.trim() && search.isSuccess && found.length === 0;
  const add = (lotId: string): void => {
    setTyped('');
    onAdd(lotId);
    input.current?.focus();
  };
  return (
    <div className="lot-search">
      <Suggested chosen={chosen} onAdd={onAdd} />
      <Field
        ref={input}
        label={t('req.addLot')}
        placeholder={t('req.addLotHint')}
        autoComplete="off"
        value={typed}
        error={words?.title}
        hint={isNone ? t('req.noneFound') : undefined}
        onChange={(event) => setTyped(event.target.value)}
      />
      {found.length > 0 ? (
        <ul className="lot-found" aria-label={t('req.found')}>
          {found.map((lot) => (
            <li key={lot.id}>
              <button type="button" onClick={() => add(lot.id)}>
                <Icon name="plus" size={16} />
                <span>
                  <span className="b">
                    <Numeral text={t('common.lot', { number: lot.number })} />
                  </span>
                  {lot.tractName === null ? null : `, ${lot.tractName}`}
                  <span className="s mid"> {lot.address}</span>
                </span>
              </button>
            </li>
          ))}
        </ul>
      ) : null}
    </div>
  );
}

function Suggested({ chosen, onAdd }: LotSearchProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const waiting = useWaiting().filter(
    (item) => item.kind === 'no-window' && item.isOnYou && item.lotId !== null && !chosen.includes(item.lotId),
  );
  if (waiting.length === 0) return null;
  return (
    <div className="suggested">
      <div className="lab">{t('req.withoutWindow', { count: waiting.length })}</div>
      <ul className="row wrap">
        {waiting.slice(0, suggestedCount).map((item) => (
          <li key={item.lotId}>
            <button
              type="button"
              className="chip"
              onClick={() => (item.lotId === null ? undefined : onAdd(item.lotId))}
            >
              <Icon name="plus" size={14} />
              <span>
                <Numeral text={t('common.lot', { number: item.lotNumber ?? '' })} />
              </span>
            </button>
          </li>
        ))}
      </ul>
    </div>
  );
}
