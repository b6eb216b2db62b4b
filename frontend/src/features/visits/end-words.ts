import { withdrawReasons, type VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useTranslation } from 'react-i18next';

/** Reasons the server writes itself when a visit is freed or goes back: worded here; the desk's own words are shown as written. */
const serverReasons: readonly string[] = ['not-up', 'closure', 'not-reached'];

/** Why a visit ended or went back, with the note; null when there is nothing to say. */
export function useEndWords(): (visit: Pick<VisitSummary, 'endReason' | 'endNote' | 'outcome'>) => string | null {
  const { t } = useTranslation('visits');
  return ({ endReason, endNote, outcome }) => {
    const reason = outcome?.reason ?? endReason;
    const known = [...withdrawReasons, ...serverReasons, ...outcomeReasons].find((code) => code === reason);
    const said = known === undefined ? reason : t(`reasons.${known}`);
    const parts = [said, endNote].filter((part) => part !== null && part !== '');
    return parts.length === 0 ? null : parts.join(': ');
  };
}

const outcomeReasons: readonly string[] = [
  'down-overnight',
  'wrong-method',
  'covered-early',
  'locked',
  'site-closed',
  'hazard',
  'permit-not-on-site',
  'not-seen',
];
