import type { OfferedWindow } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { refusedByReason, windowKey } from '../offer-reasons';
import '../offers.css';

/** The windows that cannot be taken, behind one line, by their reason. */
export function RefusedWindows({ windows, zone }: { windows: readonly OfferedWindow[]; zone: string }): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const groups = refusedByReason(windows.filter(({ whyNot }) => whyNot !== 'past'));
  if (groups.length === 0) return null;
  return (
    <details className="refused-windows">
      <summary>{t('offer.whyNot')}</summary>
      <ul>
        {groups.map((group) => (
          <li key={group.why}>
            <div className="s b">{t(`offer.refused.${group.why}`)}</div>
            <ul>
              {group.windows.map((window) => (
                <li key={windowKey(window)} className="s mid">
                  <Numeral text={words.dayWindow(window.startAt, window.endAt, zone)} />
                </li>
              ))}
            </ul>
          </li>
        ))}
      </ul>
    </details>
  );
}
