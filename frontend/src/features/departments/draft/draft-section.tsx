import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useDraftFaults } from './draft-context';

export interface DraftSectionProps {
  title: ReactNode;
  /** Where in the content its fields stand; with a fault under them it opens by itself. */
  paths: readonly string[];
  isOpen?: boolean;
  children: ReactNode;
}

/** A folded part of the draft's form, with how much in it is not right. */
export function DraftSection({ title, paths, isOpen: isOpenFirst = false, children }: DraftSectionProps): ReactNode {
  const { t } = useTranslation('departments');
  const { countUnder } = useDraftFaults();
  const [isOpen, setOpen] = useState(isOpenFirst);
  const count = paths.reduce((sum, path) => sum + countUnder(path), 0);
  return (
    <details
      className="draft-section"
      open={isOpen || count > 0}
      onToggle={(event) => {
        if (count === 0) setOpen(event.currentTarget.open);
      }}
    >
      <summary>
        <h2 className="h2">{title}</h2>
        {count > 0 ? <span className="t-red b">{t('form.faults', { count })}</span> : null}
      </summary>
      <div className="fields">{children}</div>
    </details>
  );
}
