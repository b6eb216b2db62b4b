import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { QueryState } from '../../../lib/query-state';
import { ruleCardQuery } from '../api/rule-card';
import { type Reader, useReadingAs } from '../use-reading-as';
import { RuleCardView } from './rule-card-view';

export interface ReadAsOtherProps {
  ruleCardId: string;
  /** What they read meanwhile where the version is a draft. */
  inForceId: string | null;
  reader: Exclude<Reader, 'desk'>;
}

/** The sheet as a plumber or anybody reads it: no draft, nothing of the desk; with the way back. */
export function ReadAsOther({ ruleCardId, inForceId, reader }: ReadAsOtherProps): ReactNode {
  const { t } = useTranslation('departments');
  const [, setReader] = useReadingAs();
  const card = useQuery(ruleCardQuery(ruleCardId));
  return (
    <QueryState query={card}>
      {({ state, version }) => {
        const readId = state === 'draft' ? inForceId : ruleCardId;
        return (
          <>
            <div className="read-as-strip" role="status">
              <span>
                {t(`readAs.strip.${reader}`)} {state === 'draft' ? t('readAs.noDraft', { version }) : null}
              </span>
              <Act size="sm" onClick={() => setReader('desk')}>
                {t('readAs.back')}
              </Act>
            </div>
            {readId === null ? null : <RuleCardView ruleCardId={readId} isPublic={false} isCompared={false} />}
          </>
        );
      }}
    </QueryState>
  );
}
