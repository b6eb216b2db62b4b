import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Head, PhoneHead } from '../../../components/head';
import { Numeral } from '../../../components/numeral';
import { QueryState } from '../../../lib/query-state';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { useTimeWords } from '../../../lib/time';
import { departmentQuery } from '../api/department';
import { ruleCardQuery } from '../api/rule-card';
import { ruleCardNotes, stagesInOrder } from '../rule-card-notes';
import { useRuleCardWords } from '../rule-card-words';
import { countChanges, NotesSheet } from './notes-sheet';
import { VersionState } from './version-list';

/** One version of a rule card, one stage at a time; a draft stands beside the version in force. */
export function RuleCardView({ ruleCardId, isPublic }: { ruleCardId: string; isPublic: boolean }): ReactNode {
  const card = useQuery(ruleCardQuery(ruleCardId, isPublic));
  return <QueryState query={card}>{(ruleCard) => <Sheet key={ruleCard.id} ruleCard={ruleCard} />}</QueryState>;
}

/** The version a draft will replace; null for all others. */
function useInForce({ state, departmentId }: RuleCard): RuleCard | null {
  const isDraft = state === 'draft';
  const department = useQuery({ ...departmentQuery(departmentId), enabled: isDraft });
  const inForceId = isDraft ? (department.data?.department.ruleCard?.id ?? null) : null;
  const inForce = useQuery({ ...ruleCardQuery(inForceId ?? ''), enabled: inForceId !== null });
  return inForceId === null ? null : (inForce.data ?? null);
}

function Sheet({ ruleCard }: { ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const words = useTimeWords();
  const noteWords = useRuleCardWords();
  const isPhone = useSheetWidth() === 'phone';
  const stages = stagesInOrder(ruleCard.content);
  const usual = stages.find(({ systems }) => systems.length > 1) ?? stages[0];
  const [chosen, setChosen] = useState(usual?.code ?? '');
  const inForce = useInForce(ruleCard);
  const stageName = stages.find(({ code }) => code === chosen)?.name ?? usual?.name;
  const notes = ruleCardNotes(ruleCard.content, chosen, noteWords);
  const before = inForce === null ? undefined : ruleCardNotes(inForce.content, chosen, noteWords);
  const title = t('sheet.title', { department: ruleCard.departmentName, version: ruleCard.version });
  const label = t('sheet.label', { stage: stageName === undefined ? '' : noteWords.name(stageName) });
  const choice = (
    <Choice
      label={t('sheet.stage')}
      options={stages.map((stage) => ({ value: stage.code, label: noteWords.name(stage.name) }))}
      value={chosen}
      onChange={setChosen}
      wide={isPhone}
    />
  );
  return (
    <article>
      {isPhone ? (
        <PhoneHead label={label} title={title} right={<VersionState card={ruleCard} />} />
      ) : (
        <Head
          label={label}
          title={title}
          cells={[
            { label: t('sheet.state'), value: <VersionState card={ruleCard} /> },
            {
              label: t('sheet.from'),
              value:
                ruleCard.effectiveFrom === null ? (
                  t('versions.noDate')
                ) : (
                  <Numeral text={words.dateYear(ruleCard.effectiveFrom)} />
                ),
            },
            { label: t('sheet.zone'), value: words.zone(ruleCard.zone) },
            ...(before && inForce
              ? [
                  {
                    label: t('sheet.changed', { version: inForce.version }),
                    value: t('sheet.changes', { count: countChanges(notes, before) }),
                  },
                ]
              : []),
          ]}
          acts={choice}
        />
      )}
      {isPhone ? (
        <div className="panel-body">
          {choice}
          <p className="s mid phone-facts">
            {ruleCard.effectiveFrom === null
              ? t('versions.noDate')
              : t('versions.since', { date: words.dateYear(ruleCard.effectiveFrom) })}
            . {words.zone(ruleCard.zone)}
          </p>
        </div>
      ) : null}
      <NotesSheet
        notes={notes}
        version={ruleCard.version}
        against={before && inForce && !isPhone ? { notes: before, version: inForce.version } : undefined}
      />
      <p className="s mid panel-body">{t('common.localCode')}</p>
    </article>
  );
}
