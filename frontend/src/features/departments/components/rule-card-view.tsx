import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { stageCodesInOrder } from '@holdwater/shared-types/departments/rule-card-rows.js';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { QueryState } from '../../../lib/query-state';
import { ruleCardQuery } from '../api/rule-card';
import { useRuleCardWords } from '../rule-card-words';
import { changedOnly, countRows, sheetNotes } from '../sheet-notes';
import { useAgainst } from '../use-against';
import { AgainstChoice } from './against-choice';
import { NotesSheet } from './notes-sheet';
import { RuleCardHead } from './rule-card-head';

export interface RuleCardViewProps {
  ruleCardId: string;
  isPublic: boolean;
  /** Beside another version, as the department's own and signed-in readers may look at it. */
  isCompared?: boolean;
}

/** One version of a rule card, one stage at a time; a draft stands beside the version in force. */
export function RuleCardView({ ruleCardId, isPublic, isCompared = !isPublic }: RuleCardViewProps): ReactNode {
  const card = useQuery(ruleCardQuery(ruleCardId, isPublic));
  return (
    <QueryState query={card}>
      {(ruleCard) => <Sheet key={ruleCard.id} ruleCard={ruleCard} isCompared={isCompared} />}
    </QueryState>
  );
}

function Sheet({ ruleCard, isCompared }: { ruleCard: RuleCard; isCompared: boolean }): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const words = useRuleCardWords();
  const { content, version } = ruleCard;
  const codes = stageCodesInOrder(content);
  const [chosen, setChosen] = useState(() => usualStage(ruleCard));
  const stageCode = codes.includes(chosen) ? chosen : (codes[0] ?? '');
  const [shown, setShown] = useState<'all' | 'changed'>('all');
  const isPhone = useSheetWidth() === 'phone';
  const against = useAgainst(ruleCard, !isCompared);
  const other = isCompared && !isPhone ? against.card : null;
  const notes = sheetNotes(content, other?.content ?? null, stageCode, words);
  const nameOf = (code: string): string => {
    const stage = content.stages.find((each) => each.code === code);
    return stage === undefined ? code : words.name(stage.name);
  };
  const stages = (
    <Choice
      label={t('sheet.stage')}
      options={codes.map((code) => ({ value: code, label: nameOf(code) }))}
      value={stageCode}
      onChange={setChosen}
      wide={isPhone}
    />
  );
  return (
    <article>
      <RuleCardHead
        ruleCard={ruleCard}
        stageName={nameOf(stageCode)}
        changes={other === null ? null : { version: other.version, ...countRows(notes) }}
        acts={stages}
      />
      {isCompared && !isPhone && against.others.length > 0 ? (
        <div className="compare-bar">
          <AgainstChoice against={against} />
          {other === null ? null : (
            <Choice
              label={t('against.shown')}
              options={(['all', 'changed'] as const).map((value) => ({ value, label: t(`against.${value}`) }))}
              value={shown}
              onChange={setShown}
            />
          )}
        </div>
      ) : null}
      <NotesSheet
        notes={other !== null && shown === 'changed' ? changedOnly(notes) : notes}
        version={version}
        againstVersion={other?.version ?? null}
      />
      {other !== null && shown === 'changed' && countRows(notes).changed === 0 ? (
        <p className="panel-body">{t('against.nothing', { version: other.version })}</p>
      ) : null}
      <p className="s mid panel-body">{t('common.localCode')}</p>
    </article>
  );
}

/** The stage most readers come for: the first that tests both systems. */
function usualStage({ content }: RuleCard): string {
  const codes = stageCodesInOrder(content);
  const both = content.stages.filter(({ systems }) => systems.length > 1).map(({ code }) => code);
  return codes.find((code) => both.includes(code)) ?? codes[0] ?? '';
}
