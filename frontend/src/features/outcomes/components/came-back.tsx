import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';

/** Says that what stands here was typed before, on this device, and is not recorded. */
export function CameBack({ at, zone }: { at: string | null; zone: string }): ReactNode {
  const { t } = useTranslation('outcomes');
  const time = useTimeWords();
  if (at === null) return null;
  return (
    <p className="came-back s mid" role="status">
      <Numeral text={t('form.cameBack', { at: time.dayClock(at, zone) })} />
    </p>
  );
}
