import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Cell, Cells } from '../../../components/cells';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { StateWord } from '../../../components/state-word';
import { localName, useLocale } from '../../../lib/i18n';
import { useTimeWords } from '../../../lib/time';
import { useEndWords } from '../end-words';
import { isOpen, useVisitLook } from '../visit-look';
import '../visit.css';

/** A visit as a title block: state, window, who comes, what stands, what it waits for. */
export function VisitFacts({ visit, now }: { visit: VisitSummary; now: Date }): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const locale = useLocale();
  const look = useVisitLook()(visit, now);
  const ended = useEndWords()(visit);
  const { window, zone } = visit;
  return (
    <>
      <Cells columns={2}>
        <Cell label={t('visit.state')} isWide>
          <StateWord state={look.mark} word={look.word} tone={look.tone} />
          {ended === null ? null : <div className="s mid">{ended}</div>}
        </Cell>
        <Cell label={visit.state === 'requested' ? t('visit.wished') : t('visit.window')} isWide>
          <Numeral text={words.dayWindow(window.startAt, window.endAt, zone)} />
          <div className="s mid">{`${visit.departmentName}, ${words.zone(zone, window.startAt)}`}</div>
        </Cell>
        {visit.plannedStartAt === null ? null : (
          <Cell label={t('visit.arrives')}>
            <Numeral text={t('visit.about', { time: words.clock(visit.plannedStartAt, zone) })} />
          </Cell>
        )}
        {visit.inspector === null ? null : (
          <Cell label={t('visit.inspector')}>
            {visit.inspector.name}
            <Phone number={visit.inspector.phone} />
          </Cell>
        )}
        {visit.upBy === null || !isOpen(visit) ? null : (
          <Cell label={t('visit.upBy')} tone={look.tone}>
            <Numeral text={words.dayClock(visit.upBy, zone)} />
          </Cell>
        )}
        {visit.upSince === null ? null : (
          <Cell label={t('visit.upSince')} tone="water">
            <Numeral text={words.dayClock(visit.upSince, zone)} />
          </Cell>
        )}
        <Cell label={t('visit.stage')}>
          {localName(visit.stageName, locale)}
          {visit.isRetest ? `, ${t('visit.retest')}` : null}
        </Cell>
        <Cell label={t('visit.ruleCard')}>{t('common.ruleCard', { version: visit.ruleCardVersion })}</Cell>
        {visit.neededBy === null ? null : (
          <Cell label={t('visit.neededBy')} tone="brass">
            <Numeral text={words.dayClock(visit.neededBy, zone)} />
          </Cell>
        )}
        <Cell label={t('visit.requestedAt')} isWide>
          <Numeral text={words.dayClock(visit.requestedAt, zone)} />
        </Cell>
      </Cells>
      <SystemsUp visit={visit} />
      {visit.note === null ? null : <p className="visit-note">{visit.note}</p>}
      <p className="visit-lot s">
        <Link to={`/lots/${visit.lotId}`}>{t('visit.openLot', { number: visit.lotNumber })}</Link>
        <span className="mid">
          {[visit.address, visit.builderName, visit.plumberName].filter((part) => part !== null).join(', ')}
        </span>
      </p>
    </>
  );
}

/** What stands of what is required, unit by unit. */
function SystemsUp({ visit }: { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  if (visit.systemsUp.length === 0 || !isOpen(visit)) return null;
  const hasUnits = visit.unitNumbers.length > 1;
  return (
    <ul className="systems-up" aria-label={t('visit.stands')}>
      {visit.systemsUp.map(({ unitNumber, system, isUp }) => (
        <li key={`${unitNumber} ${system}`} className={isUp ? 't-water' : 'mid'}>
          <Mark name={isUp ? 'ready' : 'booked'} />
          <span>
            {hasUnits ? `${t('common.unit', { number: unitNumber })}, ` : null}
            {t(isUp ? 'visit.systemUp' : 'visit.systemNotUp', { system: t(`common.systems.${system}`) })}
          </span>
        </li>
      ))}
    </ul>
  );
}

/** A telephone number to press. */
export function Phone({ number }: { number: string | null }): ReactNode {
  if (number === null) return null;
  return (
    <div className="s">
      <a href={`tel:${number.replace(/[^+\d]/g, '')}`}>
        <Numeral text={number} />
      </a>
    </div>
  );
}
