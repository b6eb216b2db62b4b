import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Failed } from '../../../lib/query-state';
import { useUndoStart } from '../api/undo-start';

/** Takes the start back while the server still lets it: within a minute. */
export function UndoStart({ visit }: { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation('outcomes');
  const undoing = useUndoStart();
  if (!visit.moves.includes('undo-begin') && undoing.error === null) return null;
  return (
    <div className="undo-strip">
      {visit.moves.includes('undo-begin') ? (
        <>
          <span className="s mid">{t('undo.text')}</span>
          <Act
            kind="text"
            size="sm"
            busy={undoing.isPending}
            onClick={() => undoing.mutate({ visitId: visit.id, expectedVersion: visit.version })}
          >
            {t('undo.act')}
          </Act>
        </>
      ) : null}
      {undoing.error === null ? null : <Failed error={undoing.error} level={2} />}
    </div>
  );
}
