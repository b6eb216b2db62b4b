import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';

export type ThreadView = 'all' | 'words';

/** Everything, or only what people wrote. */
export function ThreadFilter({
  view,
  onChange,
}: {
  view: ThreadView;
  onChange: (view: ThreadView) => void;
}): ReactNode {
  const { t } = useTranslation('threads');
  return (
    <Choice
      label={t('filter.label')}
      options={[
        { value: 'all', label: t('filter.all') },
        { value: 'words', label: t('filter.words') },
      ]}
      value={view}
      onChange={onChange}
    />
  );
}
