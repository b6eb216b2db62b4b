import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { countSources } from '@holdwater/shared-types/departments/rule-card-sources.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Panel } from '../../../components/panel';
import { useTimeWords } from '../../../lib/time';
import { readers, useReadingAs } from '../use-reading-as';

/** Desk: reads it as another role does; who edited it, and where its values come from. */
export function ReadAsPanel({ ruleCard: { edited, zone, content } }: { ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation('departments');
  const words = useTimeWords();
  const [reader, setReader] = useReadingAs();
  const { local, fromModelCode } = countSources(content);
  return (
    <Panel title={t('readAs.title')}>
      <Choice
        label={t('readAs.title')}
        options={readers.map((value) => ({ value, label: t(`readAs.${value}`) }))}
        value={reader}
        onChange={setReader}
      />
      <dl className="facts-list">
        {!edited ? null : (
          <>
            <dt className="s mid">{t('readAs.edited')}</dt>
            <dd>{t('readAs.editedBy', { name: edited.by, at: words.dayClock(edited.at, zone) })}</dd>
          </>
        )}
        <dt className="s mid">{t('readAs.sources')}</dt>
        <dd>{t('readAs.counted', { local, fromModelCode })}</dd>
      </dl>
    </Panel>
  );
}
