import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import type { WhyNotUp } from '../up-act';

export interface TestActsProps {
  /** Null: the reader may not say it, or it is said already. */
  up: { readonly why: WhyNotUp | null; readonly isTyped: boolean } | null;
  /** Why the reading cannot be saved yet; null when it can. */
  cannotSave: string | null;
  isStarting: boolean;
  busy: 'up' | 'save' | null;
  onUp: () => void;
  onSave: () => void;
}

/** The foot of the page: say that the test is up, or save the reading alone. What is missing stands in the act. */
export function TestActs({ up, cannotSave, isStarting, busy, onUp, onSave }: TestActsProps): ReactNode {
  const { t } = useTranslation('holds');
  const why = useWhyWords();
  const saveWord =
    up === null ? (isStarting ? 'acts.start' : 'acts.save') : isStarting ? 'acts.startOnly' : 'acts.saveOnly';
  const isUpFirst = up !== null && up.why === null;
  return (
    <>
      <Act
        size="lg"
        kind={isUpFirst ? 'other' : 'first'}
        cannotYet={cannotSave ?? undefined}
        busy={busy === 'save'}
        busyWord={t('acts.saving')}
        onClick={onSave}
      >
        {t(saveWord)}
      </Act>
      {up === null ? null : (
        <Act
          size="lg"
          kind="first"
          cannotYet={up.why === null ? undefined : why(up.why)}
          busy={busy === 'up'}
          busyWord={t('acts.saying')}
          onClick={onUp}
        >
          {t(up.isTyped ? 'acts.saveUp' : 'acts.up')}
        </Act>
      )}
    </>
  );
}

/** What is missing, in a few words that stand in the act. */
export function useWhyWords(): (why: WhyNotUp) => string {
  const { t } = useTranslation(['holds', 'common']);
  return (why) => {
    if (why.code === 'below') return t('why.below', { psi: why.minimumPsi });
    if (why.code !== 'not-up') return t(`why.${why.code}`);
    const units = new Set(why.parts.map(({ unitNumber }) => unitNumber));
    const isOneUnit = units.size === 1;
    const names = why.parts.map(({ unitNumber, system }) => {
      const name = t(`common.systems.${system}`);
      return isOneUnit ? name : t('why.ofUnit', { system: name, unit: unitNumber });
    });
    return t('why.not-up', { systems: [...new Set(names)].join(', ') });
  };
}
