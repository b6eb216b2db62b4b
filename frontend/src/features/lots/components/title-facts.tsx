import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Cell, Cells } from '../../../components/cells';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { ReplaceParty } from './replace-party';

const organizationKinds = { builder: 'builder', plumber: 'plumber', department: 'department' } as const;

/** Permit, rule card, cover date, the parties with their telephones, and how to get in. */
export function TitleFacts({ lot }: { lot: LotDetail }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const { permit, ruleCard } = lot;
  const isPermitMissing = permit.status !== 'issued';
  return (
    <>
      <Cells columns={2}>
        <Cell label={t('title.permit')} tone={isPermitMissing ? 'brass' : undefined}>
          {permit.number === null ? null : <span className="n">{permit.number} </span>}
          {isPermitMissing || permit.number === null ? t(`permits.${permit.status}`) : null}
          {permit.holder === null ? null : <div className="s mid">{permit.holder}</div>}
        </Cell>
        <Cell label={t('title.ruleCard')}>
          {ruleCard === null ? (
            t('common.none')
          ) : (
            <Link to={`/rule-cards/${ruleCard.id}`}>
              <Numeral
                text={
                  ruleCard.effectiveFrom === null
                    ? t('common.ruleCard', { version: ruleCard.version })
                    : t('title.ruleCardSince', { version: ruleCard.version, date: words.date(ruleCard.effectiveFrom) })
                }
              />
            </Link>
          )}
        </Cell>
        {lot.coverDate === null ? null : (
          <Cell label={t('title.coverDate')} isWide>
            <Numeral text={words.dateYear(lot.coverDate)} />
          </Cell>
        )}
      </Cells>
      <Cells>
        {lot.parties.map((one) => (
          <Cell key={`${one.kind} ${one.organization.id}`} label={t(`parties.${organizationKinds[one.kind]}`)}>
            <div className="spread">
              <span>{one.organization.name}</span>
              {one.status === 'attached' ? (
                <Phone number={one.organization.phone} />
              ) : (
                <span className={one.status === 'pending' ? 't-brass s' : 't-red s'}>{t(`parties.${one.status}`)}</span>
              )}
            </div>
            {one.people.map((person) => (
              <div key={person.id} className="spread s mid">
                <span>{person.name}</span>
                <Phone number={person.phone} />
              </div>
            ))}
            {one.status === 'attached' && one.kind !== 'department' ? (
              <ReplaceParty lot={lot} kind={one.kind} former={one.organization} />
            ) : null}
          </Cell>
        ))}
        {lot.access === null ? null : <AccessCells access={lot.access} />}
      </Cells>
    </>
  );
}

function AccessCells({ access }: { access: NonNullable<LotDetail['access']> }): ReactNode {
  const { t } = useTranslation('lots');
  const { gateCode, contactName, contactPhone, hazards } = access;
  if (gateCode === null && contactName === null && contactPhone === null && hazards === null) return null;
  return (
    <Cell label={t('title.access')}>
      {gateCode === null ? null : (
        <div>
          {t('title.gate')} <span className="n">{gateCode}</span>
        </div>
      )}
      {contactName === null && contactPhone === null ? null : (
        <div className="spread s mid">
          <span>{contactName ?? t('title.contact')}</span>
          <Phone number={contactPhone} />
        </div>
      )}
      {hazards === null ? null : <div className="s t-brass">{hazards}</div>}
    </Cell>
  );
}

function Phone({ number }: { number: string | null }): ReactNode {
  if (number === null) return null;
  return (
    <a className="n s tel" href={`tel:${number.replace(/[^+\d]/g, '')}`}>
      {number}
    </a>
  );
}
