import type { NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Mark } from '../../../components/mark';

export interface DraftCorrectionsProps {
  corrections: readonly { readonly number: number; readonly correction: NewCorrection }[];
  /** Null opens a new one. */
  onOpen: (clientId: string | null) => void;
  addWord: string;
}

/** Corrections opened on this visit, not recorded yet; each can be opened again. */
export function DraftCorrections({ corrections, onOpen, addWord }: DraftCorrectionsProps): ReactNode {
  const { t } = useTranslation('outcomes');
  return (
    <div className="draft-corrections">
      {corrections.length === 0 ? null : (
        <ul>
          {corrections.map(({ number, correction }) => (
            <li key={correction.clientId}>
              <button type="button" onClick={() => onOpen(correction.clientId)}>
                <Mark name="correction-open" number={number} size={28} title={t('correction.number', { number })} />
                <span className="grow">{correction.text}</span>
                <span className="s mid">{t(`severity.${correction.severity}`)}</span>
              </button>
            </li>
          ))}
        </ul>
      )}
      <Act kind="text" size="sm" icon="corrections" onClick={() => onOpen(null)}>
        {addWord}
      </Act>
    </div>
  );
}
