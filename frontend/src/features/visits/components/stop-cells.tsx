import { methods, type Method } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Cell, Cells, type CellProps } from '../../../components/cells';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import type { RunStop } from '../api/run';
import { Phone } from './visit-facts';

type Facts = Pick<CellProps, 'label' | 'children' | 'wash' | 'isWide'> & { readonly key: string };

/**
 * What must stand, system by system: the rule card's minimum and the level filled to, never what is expected to be read. Then the gate, who
 * is on site and what to mind, on the day only and only where the server tells it.
 */
export function StopCells({ stop }: { stop: RunStop }): ReactNode {
  const asked = useAskedFacts(stop);
  const access = useAccessFacts(stop);
  const narrow = [...asked, ...access.filter(({ isWide }) => !isWide)];
  const wide = access.filter(({ isWide }) => isWide);
  if (narrow.length + wide.length === 0) return null;
  return (
    <Cells columns={2}>
      {narrow.map(({ key, ...cell }, index) => (
        // The odd one at the end takes the whole row.
        <Cell key={key} {...cell} isWide={index === narrow.length - 1 && index % 2 === 0} />
      ))}
      {wide.map(({ key, ...cell }) => (
        <Cell key={key} {...cell} />
      ))}
    </Cells>
  );
}

function useAskedFacts({ asks, visit }: RunStop): Facts[] {
  const { t } = useTranslation(['visits', 'common']);
  const hasUnits = visit.unitNumbers.length > 1;
  /** "24.0 ft, attic cut", "at least 100 psi" */
  const wordsOf = ({ levelFt, minimumPsi, method }: RunStop['asks'][number]): string => {
    const parts = [
      levelFt === null ? null : t('run.level', { feet: levelFt.toFixed(1) }),
      minimumPsi === null ? null : t('run.atLeast', { psi: minimumPsi }),
      method === null || method === 'gauge' || !isMethod(method) ? null : t(`run.methods.${method}`),
    ].filter((part) => part !== null);
    return parts.length === 0 ? t('run.untilSeen') : parts.join(', ');
  };
  return asks.map((ask) => {
    const up = visit.systemsUp.find(({ unitNumber, system }) => unitNumber === ask.unitNumber && system === ask.system);
    const label = [
      hasUnits ? t('common.unit', { number: ask.unitNumber }) : null,
      t(up?.isUp === true ? 'run.up' : 'run.notUp', { system: t(`common.systems.${ask.system}`) }),
    ];
    return {
      key: `${ask.unitNumber} ${ask.system}`,
      label: label.filter((part) => part !== null).join(', '),
      children: <Numeral text={wordsOf(ask)} />,
    };
  });
}

function useAccessFacts({ access }: RunStop): Facts[] {
  const { t } = useTranslation('visits');
  const { gateCode = null, contactName = null, contactPhone = null, hazards = null } = access ?? {};
  const facts: Facts[] = [];
  if (gateCode !== null)
    facts.push({ key: 'gate', label: t('run.gate'), children: <span className="n">{gateCode}</span> });
  if (contactName !== null || contactPhone !== null) {
    facts.push({
      key: 'contact',
      label: t('run.contact'),
      children: (
        <>
          {contactName}
          <Phone number={contactPhone} />
        </>
      ),
    });
  }
  if (hazards !== null) {
    facts.push({
      key: 'hazards',
      label: t('run.hazards'),
      wash: 'brass',
      isWide: true,
      children: (
        <>
          <Mark name="waits-on-you" size={16} /> {hazards}
        </>
      ),
    });
  }
  return facts;
}

function isMethod(code: string): code is Method {
  return methods.some((one) => one === code);
}
