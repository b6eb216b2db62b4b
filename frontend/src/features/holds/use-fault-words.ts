import { useTranslation } from 'react-i18next';
import { useFieldWords } from '../../lib/errors';

const ownFaults = ['above-gauge-range', 'gauge-ends-below-minimum', 'method-not-accepted', 'medium-not-accepted'];

/** Words of what is wrong with a field of a test: the trade's own faults, else those every form has. */
export function useFaultWords(): (fault: string | undefined) => string | undefined {
  const { t } = useTranslation('holds');
  const common = useFieldWords();
  return (fault) => (fault !== undefined && ownFaults.includes(fault) ? t(`faults.${fault}`) : common(fault));
}
