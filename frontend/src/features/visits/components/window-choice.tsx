import type { VisitWindow } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../../../components/icon';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { windowKey } from '../offer-reasons';
import '../offers.css';

export interface ChoosableWindow extends VisitWindow {
  readonly roomLeft: number;
  readonly isTakeable: boolean;
}

export interface WindowChoiceProps {
  label: string;
  windows: readonly ChoosableWindow[];
  value: string | null;
  zone: string;
  /** Without the day, where all are of one. */
  isOneDay?: boolean;
  onChoose: (key: string) => void;
}

/** Windows to choose one of, with their room; those that cannot be taken are hatched and say so. */
export function WindowChoice({ label, windows, value, zone, isOneDay, onChoose }: WindowChoiceProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  return (
    <div role="radiogroup" aria-label={label} className="offers">
      {windows.map((window) => {
        const key = windowKey(window);
        const isOn = key === value;
        const when = isOneDay
          ? words.window(window.startAt, window.endAt, zone)
          : words.dayWindow(window.startAt, window.endAt, zone);
        return (
          <label key={key} className={['offer', isOn ? 'on' : '', window.isTakeable ? '' : 'off'].join(' ')}>
            <input
              type="radio"
              className="hidden-words"
              name={label}
              checked={isOn}
              disabled={!window.isTakeable}
              onChange={() => onChoose(key)}
            />
            <span className="grow">
              <span className="b">
                <Numeral text={when} />
              </span>
              <span className="s mid">
                {' '}
                <Numeral
                  text={window.isTakeable ? t('window.room', { count: window.roomLeft }) : t('window.notTakeable')}
                />
              </span>
            </span>
            {isOn ? <Icon name="check" size={16} className="t-primer" /> : null}
          </label>
        );
      })}
    </div>
  );
}
