import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Numeral } from '../../../components/numeral';
import { useNow } from '../../../lib/clock';
import { useTimeWords } from '../../../lib/time';
import type { OutcomeDraft } from '../outcome-draft';

export interface KindChoiceProps {
  visit: VisitSummary;
  draft: OutcomeDraft;
  onChange: (draft: OutcomeDraft) => void;
}

/** Seen, or not ready and no access: those only once the window has opened, since they cost somebody something. */
export function KindChoice({ visit, draft, onChange }: KindChoiceProps): ReactNode {
  const { t } = useTranslation(['outcomes', 'marks']);
  const time = useTimeWords();
  const now = useNow();
  const isOpen = Date.parse(visit.window.startAt) <= now.getTime();
  return (
    <div className="panel-body kind-choice">
      <Choice
        label={t('kind.label')}
        wide
        options={[
          { value: 'seen', label: t('kind.seen') },
          { value: 'not-ready', label: t('marks.not-ready'), mark: 'not-ready', isOff: !isOpen },
          { value: 'no-access', label: t('marks.no-access'), mark: 'no-access', isOff: !isOpen },
        ]}
        value={draft.kind}
        onChange={(kind) => onChange({ ...draft, kind })}
      />
      {isOpen ? null : (
        <p className="s mid">
          <Numeral text={t('kind.later', { at: time.clock(visit.window.startAt, visit.zone) })} />
        </p>
      )}
    </div>
  );
}
