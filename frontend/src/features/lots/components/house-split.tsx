import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { Cutaway } from '../../../drawings/cutaway';
import { drawnDraft, type HouseDraft } from '../house-draft';

/** A form of a house with its section, drawn as it is typed: beside it at a desk, under it on a phone. */
export function HouseSplit({ draft, children }: { draft: HouseDraft; children: ReactNode }): ReactNode {
  const { t } = useTranslation('lots');
  const isPhone = useSheetWidth() === 'phone';
  return (
    <div className="house-split">
      <div className="house-typed">{children}</div>
      <aside aria-label={t('section.title')}>
        <div className="house-drawing">
          <Cutaway
            house={drawnDraft(draft)}
            method={null}
            fillLevelFt={null}
            units={draft.measures.units}
            maxHeight={isPhone ? 240 : 420}
          />
          <p className="s mid">{t('house.drawn')}</p>
        </div>
      </aside>
    </div>
  );
}
