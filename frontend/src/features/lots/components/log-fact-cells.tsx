import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Numeral } from '../../../components/numeral';
import type { LogFact } from '../../holds/log-facts';
import type { FoundAnalysis } from '../../holds/use-test-analysis';
import { verdictMeasures } from '../../holds/verdict-measures';

interface OfFact {
  fact: LogFact | undefined;
  found: FoundAnalysis | undefined;
}

/** In columns: since settled with water, what temperature says and leaves over with air. */
export function FactCells({ fact, found, columns }: OfFact & { columns: number }): ReactNode {
  const words = useFactWords();
  if (fact === undefined || found === undefined) return <td colSpan={columns} />;
  const { state, since, says, left } = words(fact, found);
  if (columns === 1)
    return (
      <td className={fact.kind === 'counted' ? '' : 'mut'}>
        <Numeral text={[since, state].filter(Boolean).join(', ')} />
      </td>
    );
  if (says === null) {
    return (
      <td colSpan={columns} className="mut">
        {state}
      </td>
    );
  }
  return (
    <>
      <td className="n">{says}</td>
      <td className="n">{left}</td>
    </>
  );
}

/** What happened at a reading; with `isWhole`, where there are no columns, also what it comes to. */
export function FactLines({
  fact,
  found,
  isWhole,
}: {
  fact: LogFact;
  found: FoundAnalysis;
  isWhole: boolean;
}): ReactNode {
  const { t } = useTranslation('lots');
  const words = useFactWords();
  const { state, since, says, left, jumped, pumped } = words(fact, found);
  const whole = [
    says === null || left === null ? null : t('log.saysLine', { says, left }),
    since === null || says !== null || fact.kind !== 'counted' ? null : t('log.sinceLine', { drop: since }),
    fact.kind === 'gauge-only' ? null : state,
  ].filter((line) => line !== null && line !== '');
  return (
    <>
      {[jumped, pumped]
        .filter((line) => line !== null)
        .map((line) => (
          <span key={line} className="s t-brass row">
            <Numeral text={line} />
          </span>
        ))}
      {isWhole && whole.length > 0 ? (
        <span className="s mut row">
          <Numeral text={whole.join(', ')} />
        </span>
      ) : null}
    </>
  );
}

function useFactWords() {
  const { t } = useTranslation('lots');
  const { units } = useMe();
  return (fact: LogFact, { analysis }: FoundAnalysis) => {
    const measures = verdictMeasures(analysis, units);
    const signed = (value: number, number: string): string =>
      Number(number) === 0 ? '0' : `${value < 0 ? '−' : '+'}${number}`;
    const read = (value: number): string => signed(value, measures.read(Math.abs(value)).number);
    const worked = (value: number): string => signed(value, measures.worked(Math.abs(value)).number);
    const [least, most] = (fact.says ?? []).map((value) => measures.worked(value).number);
    const states = {
      'gauge-only': t('log.gaugeOnly'),
      'not-counted': t('log.notCounted'),
      reference: t('log.counted'),
      counted: '',
    };
    return {
      state: states[fact.kind],
      since: fact.since === null ? null : read(fact.since),
      says: least === undefined ? null : least === most ? least : `${least}–${most}`,
      left: fact.left === null ? null : worked(fact.left),
      jumped: fact.jumpedBy === null ? null : t('log.jumped', { by: read(fact.jumpedBy).replace('+', '') }),
      pumped:
        fact.pumpedFrom === null ? null : t('log.pumped', { from: measures.read(Math.abs(fact.pumpedFrom)).number }),
    };
  };
}
