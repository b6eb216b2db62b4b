import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Correction, NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Failed } from '../../../lib/query-state';
import { Field } from '../../../components/field';
import type { TypedCorrection } from '../kept-outcome';
import { subjectKey } from '../outcome-draft';
import { useOutcomeForm } from '../use-outcome-form';
import { CameBack } from './came-back';
import { CorrectionEditor, type EditedCorrection } from './correction-editor';
import { EarlierCorrections } from './earlier-corrections';
import { KindChoice } from './kind-choice';
import { OutcomeFoot } from './outcome-foot';
import { SystemSubject } from './system-subject';
import { UndoStart } from './undo-start';
import { UnseenForm } from './unseen-form';
import { useAsksWords } from '../use-asks-words';
import { WorkSubject } from './work-subject';

export interface OutcomeFormProps {
  visit: VisitSummary;
  lot: LotDetail;
  stage: Stage;
  ruleCard: RuleCard;
  holds: readonly Hold[];
  corrections: readonly Correction[];
  /** The page's own head; the correction has another. */
  head: ReactNode;
}

/** The correction that was being written when the page was left. */
function editedAgain(typed: TypedCorrection | null): EditedCorrection | null {
  if (typed === null) return null;
  const { values, ...edited } = typed;
  return { ...edited, key: crypto.randomUUID(), values };
}

/** What the inspector found: systems, the work and corrections; or not ready, or no access. */
export function OutcomeForm(props: OutcomeFormProps): ReactNode {
  const { visit, lot, stage, ruleCard, head } = props;
  const { t } = useTranslation(['outcomes', 'common']);
  const form = useOutcomeForm(props);
  const { draft, setDraft, numbered } = form;
  const { setCorrection } = form;
  const [edited, setEditedNow] = useState<EditedCorrection | null>(() => editedAgain(form.correction));
  const setEdited = (next: EditedCorrection | null): void => {
    setEditedNow(next);
    if (next === null) setCorrection(null);
  };
  const asks = useAsksWords(ruleCard, stage.code);
  const open = (next: EditedCorrection): void => {
    setEdited(next);
    window.scrollTo(0, 0);
  };
  const put = (correction: NewCorrection, another: EditedCorrection | null): void => {
    form.putCorrection(correction);
    setEdited(another);
    window.scrollTo(0, 0);
  };
  if (edited !== null) {
    return (
      <CorrectionEditor
        key={edited.key}
        edited={edited}
        onTyped={setCorrection}
        visit={visit}
        lot={lot}
        rules={ruleCard.content.corrections}
        others={numbered}
        drains={form.holdOf({ unitNumber: edited.unitNumber, system: 'dwv' })}
        number={form.numberOf(edited.given?.clientId ?? null)}
        onPut={put}
        onDrop={(clientId) => {
          form.dropCorrection(clientId);
          setEdited(null);
        }}
        onLeave={() => setEdited(null)}
      />
    );
  }
  const hasUnits = visit.unitNumbers.length > 1;
  const find = (clientId: string | null): NewCorrection | null =>
    draft.corrections.find((one) => one.clientId === clientId) ?? null;
  return (
    <>
      {head}
      <UndoStart visit={visit} />
      <CameBack at={form.cameBackFrom} zone={visit.zone} />
      <KindChoice visit={visit} draft={draft} onChange={setDraft} />
      {draft.kind === 'seen' ? (
        <>
          {form.subjects.map((subject) => {
            const hold = form.holdOf(subject);
            const key = subjectKey(subject);
            const name = t(`common.systems.${subject.system}`);
            return (
              <SystemSubject
                key={key}
                subject={subject}
                name={hasUnits ? t('subject.ofUnit', { system: name, unit: subject.unitNumber }) : name}
                asks={asks(subject.system, hold)}
                hold={hold}
                house={form.houseOf(subject.unitNumber)}
                zone={visit.zone}
                isLevel={form.isLevel(subject)}
                draft={form.systemOf(subject)}
                onChange={(system) => setDraft({ ...draft, systems: { ...draft.systems, [key]: system } })}
                corrections={numbered.filter(
                  ({ correction }) =>
                    correction.subject === subject.system && correction.unitNumber === subject.unitNumber,
                )}
                onCorrect={(clientId) =>
                  open({
                    key: crypto.randomUUID(),
                    subject: subject.system,
                    unitNumber: subject.unitNumber,
                    pointCode: null,
                    given: find(clientId),
                  })
                }
                fault={form.faultOf(subject)}
              />
            );
          })}
          <WorkSubject
            stage={stage}
            lookedAt={draft.lookedAt}
            onLook={form.look}
            corrections={numbered.filter(({ correction }) => correction.subject === 'work')}
            onCorrect={(pointCode, clientId) =>
              open({
                key: crypto.randomUUID(),
                subject: 'work',
                unitNumber: visit.unitNumbers[0] ?? 1,
                pointCode,
                given: find(clientId),
              })
            }
          />
          <EarlierCorrections
            corrections={form.earlier}
            decisions={draft.decisions}
            onDecide={form.decide}
            areFaultsShown={form.verdict.why?.code === 'reopen-why'}
          />
        </>
      ) : (
        <UnseenForm draft={draft} onChange={setDraft} />
      )}
      <div className="panel-body">
        <Field
          label={t('form.note')}
          isOptional
          maxLength={2000}
          value={draft.note}
          onChange={(event) => setDraft({ ...draft, note: event.target.value })}
        />
      </div>
      {form.error === null ? null : <Failed error={form.error} level={2} />}
      <OutcomeFoot
        visit={visit}
        stage={stage}
        draft={draft}
        verdict={form.verdict}
        busy={form.isSending}
        error={form.errorWords}
        onRecord={form.record}
      />
    </>
  );
}
