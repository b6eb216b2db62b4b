import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';
import { NoteLines } from '../../../components/note-lines';
import { localName, useLocale } from '../../../lib/i18n';
import { placeWords } from '../place-words';
import { DraftCorrections } from './draft-corrections';

export interface WorkSubjectProps {
  stage: Stage;
  lookedAt: readonly string[];
  onLook: (pointCode: string, isLookedAt: boolean) => void;
  corrections: readonly { readonly number: number; readonly correction: NewCorrection }[];
  /** Opens a correction at a point, or the one that is there. */
  onCorrect: (pointCode: string | null, clientId: string | null) => void;
}

/** The work: the rule card's points, each looked at on its own; no act answers all of them. */
export function WorkSubject({ stage, lookedAt, onLook, corrections, onCorrect }: WorkSubjectProps): ReactNode {
  const { t } = useTranslation(['outcomes', 'marks']);
  const locale = useLocale();
  const words = { text: t('work.title') };
  const at = (code: string) => corrections.filter(({ correction }) => correction.pointCode === code);
  const lines = stage.work.map(({ code, label }) => {
    const [first] = at(code);
    return {
      id: code,
      text: localName(label, locale),
      isLookedAt: lookedAt.includes(code),
      correction: first && { number: first.number, state: 'correction-open' as const },
      note: first && [placeWords(t, first.correction), first.correction.text].filter(Boolean).join(': '),
    };
  });
  const pointless = corrections.filter(({ correction }) => correction.pointCode == null);
  const more = corrections.filter(({ correction }, index) => {
    const { pointCode } = correction;
    return pointCode != null && corrections.findIndex((one) => one.correction.pointCode === pointCode) !== index;
  });
  return (
    <section className="work" aria-labelledby="subject-work">
      <div className="spread wrap work-head">
        <h2 className="h2 row" id="subject-work">
          <Mark name={lookedAt.length > 0 ? 'looked-at' : 'not-looked-at'} size={24} />
          {words.text}
        </h2>
        <span className="s mid">
          {lookedAt.length === 0
            ? t('marks.not-looked-at')
            : t('work.lookedAt', { count: lookedAt.length, of: stage.work.length })}
        </span>
      </div>
      {stage.work.length === 0 ? <p className="panel-body mid">{t('work.noPoints')}</p> : null}
      <NoteLines
        label={words.text}
        lines={lines}
        onLook={onLook}
        onCorrect={(code) => onCorrect(code, at(code)[0]?.correction.clientId ?? null)}
      />
      <div className="panel-body">
        <DraftCorrections
          corrections={[...pointless, ...more]}
          onOpen={(clientId) => onCorrect(null, clientId)}
          addWord={t('work.other')}
        />
      </div>
    </section>
  );
}
