import { methods, type Method } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Cell, Cells } from '../../../components/cells';
import { Numeral } from '../../../components/numeral';
import type { RunStop } from '../api/run';

/** What must stand, system by system: the rule card's minimum and the level filled to. Never what is expected to be read. */
export function StopAsks({ stop: { asks, visit } }: { stop: RunStop }): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  if (asks.length === 0) return null;
  /** "24.0 ft, attic cut", "at least 100 psi" */
  const wordsOf = ({ levelFt, minimumPsi, method }: RunStop['asks'][number]): string => {
    const parts = [
      levelFt === null ? null : t('run.level', { feet: levelFt.toFixed(1) }),
      minimumPsi === null ? null : t('run.atLeast', { psi: minimumPsi }),
      method === null || method === 'gauge' || !isMethod(method) ? null : t(`run.methods.${method}`),
    ].filter((part) => part !== null);
    return parts.length === 0 ? t('run.untilSeen') : parts.join(', ');
  };
  const hasUnits = visit.unitNumbers.length > 1;
  return (
    <Cells columns={2}>
      {asks.map((ask) => {
        const up = visit.systemsUp.find(
          ({ unitNumber, system }) => unitNumber === ask.unitNumber && system === ask.system,
        );
        const label = [
          hasUnits ? t('common.unit', { number: ask.unitNumber }) : null,
          t(up?.isUp === true ? 'run.up' : 'run.notUp', { system: t(`common.systems.${ask.system}`) }),
        ];
        return (
          <Cell key={`${ask.unitNumber} ${ask.system}`} label={label.filter((part) => part !== null).join(', ')}>
            <Numeral text={wordsOf(ask)} />
          </Cell>
        );
      })}
    </Cells>
  );
}

function isMethod(code: string): code is Method {
  return methods.some((one) => one === code);
}
