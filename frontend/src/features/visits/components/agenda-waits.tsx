import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';

/** Under a day's head, on whom its tests wait and until when: "Waits on Dunlatch Plumbing: tests up by 7:00 am", one line a name. */
export function AgendaWaits({ visits }: { visits: readonly VisitSummary[] }): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const lines = [...new Set(visits.map(nameOf))].flatMap((name) => {
    const [first] = visits.filter((visit) => nameOf(visit) === name).sort(byDeadline);
    if (first === undefined || first.upBy === null) return [];
    const time = words.clock(first.upBy, first.zone);
    return [name === null ? t('agenda.waitsOnYou', { time }) : t('agenda.waitsOn', { name, time })];
  });
  return lines.map((line) => (
    <p key={line} className="agenda-waits s mid">
      <Numeral text={line} />
    </p>
  ));
}

/** Null: the reader. */
function nameOf({ moves, plumberName, builderName }: VisitSummary): string | null {
  return moves.includes('say-test-up') ? null : (plumberName ?? builderName);
}

function byDeadline(a: VisitSummary, b: VisitSummary): number {
  return Date.parse(a.upBy ?? '') - Date.parse(b.upBy ?? '');
}
