import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Icon } from '../../../components/icon';
import { Numeral } from '../../../components/numeral';
import { useTimeWords, type TimeWords } from '../../../lib/time';
import { windowKey, type OfferReason } from '../offer-reasons';
import type { Offer } from '../use-requesting';
import '../offers.css';

export interface OfferListProps {
  offers: readonly Offer[];
  chosen: Offer | null;
  zone: string;
  /** Names the group: "Windows on offer". */
  label: string;
  onChoose: (key: string) => void;
}

/** How many are shown at first; the best stand on top. */
export const shownOffers = 4;

/** Windows that can be taken, in order, each with what speaks for it and against. */
export function OfferList({ offers, chosen, zone, label, onChoose }: OfferListProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const [isAll, setIsAll] = useState(false);
  const isChosenHidden = chosen !== null && chosen.number > shownOffers;
  const shown = isAll || isChosenHidden ? offers : offers.slice(0, shownOffers);
  return (
    <>
      <div role="radiogroup" aria-label={label} className="offers">
        {shown.map((offer) => {
          const isOn = offer.number === chosen?.number;
          return (
            <label key={windowKey(offer.window)} className={isOn ? 'offer on' : 'offer'}>
              <input
                type="radio"
                className="hidden-words"
                name="offer"
                checked={isOn}
                onChange={() => onChoose(windowKey(offer.window))}
              />
              <span className="offer-no n" aria-hidden="true">
                {offer.number}
              </span>
              <span className="grow">
                <span className="offer-when">
                  <Numeral text={words.dayWindow(offer.window.startAt, offer.window.endAt, zone)} />
                </span>
                {isOn ? null : (
                  <span className="s mid">
                    <Numeral text={t('offer.room', { count: offer.window.roomLeft })} />
                  </span>
                )}
                {isOn ? <Reasons reasons={offer.reasons} zone={zone} words={words} /> : null}
              </span>
              {isOn ? (
                <span className="row s b offer-chosen">
                  <Icon name="check" size={16} />
                  {t('offer.chosen')}
                </span>
              ) : null}
            </label>
          );
        })}
      </div>
      {offers.length > shown.length ? (
        <Act kind="text" size="sm" onClick={() => setIsAll(true)}>
          {t('offer.more', { count: offers.length - shown.length })}
        </Act>
      ) : null}
    </>
  );
}

/** A check for what speaks for a window, a dash for what speaks against. */
function Reasons({
  reasons,
  zone,
  words,
}: {
  reasons: readonly OfferReason[];
  zone: string;
  words: TimeWords;
}): ReactNode {
  const { t } = useTranslation('visits');
  return (
    <span className="reasons" role="list">
      {reasons.map((reason) => (
        <span key={reason.code} className="s mid" role="listitem">
          <Icon
            name={reason.isFor ? 'check' : 'minus'}
            size={16}
            title={t(reason.isFor ? 'offer.for' : 'offer.against')}
            className={reason.isFor ? 't-green' : 't-brass'}
          />
          <span>
            <Numeral
              text={t(`offer.reasons.${reason.code}`, {
                count: reason.count ?? 0,
                at: reason.at === undefined ? '' : words.dayClock(reason.at, zone),
              })}
            />
          </span>
        </span>
      ))}
    </span>
  );
}
