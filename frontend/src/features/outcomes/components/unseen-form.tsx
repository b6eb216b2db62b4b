import { noAccessReasons, notReadyReasons } from '@holdwater/shared-types/outcomes/outcome.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Panel } from '../../../components/panel';
import type { OutcomeDraft } from '../outcome-draft';

export interface UnseenFormProps {
  draft: OutcomeDraft;
  onChange: (draft: OutcomeDraft) => void;
}

/** Not ready or no access: one reason takes the place of the subjects. */
export function UnseenForm({ draft, onChange }: UnseenFormProps): ReactNode {
  const { t } = useTranslation('outcomes');
  const isNotReady = draft.kind === 'not-ready';
  return (
    <Panel title={t(`unseen.${isNotReady ? 'not-ready' : 'no-access'}`)}>
      {isNotReady ? (
        <Choice
          label={t('unseen.why')}
          isLabelShown
          stacked
          wide
          size="lg"
          options={notReadyReasons.map((value) => ({ value, label: t(`reasons.${value}`) }))}
          value={draft.notReady}
          onChange={(notReady) => onChange({ ...draft, notReady })}
        />
      ) : (
        <Choice
          label={t('unseen.why')}
          isLabelShown
          stacked
          wide
          size="lg"
          options={noAccessReasons.map((value) => ({ value, label: t(`reasons.${value}`) }))}
          value={draft.noAccess}
          onChange={(noAccess) => onChange({ ...draft, noAccess })}
        />
      )}
    </Panel>
  );
}
