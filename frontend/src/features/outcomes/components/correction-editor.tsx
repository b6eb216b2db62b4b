import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { emptyHouse } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { severities, type CorrectionSubject } from '@holdwater/shared-types/outcomes/correction.states.js';
import { newCorrection, type NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Panel } from '../../../components/panel';
import { TaskFoot, TaskHead } from '../../../components/task-head';
import { useIsPhone } from '../../../lib/use-media';
import { useContractForm } from '../../../lib/use-contract-form';
import { emptyCorrection, toNewCorrection, type CorrectionDraft } from '../correction-draft';
import type { TypedCorrection } from '../kept-outcome';
import { CorrectionPlace } from './correction-place';
import { CorrectionWhat } from './correction-what';
import { SectionChoice } from './section-choice';

export interface EditedCorrection {
  /** One per opening, so that nothing of the last one stays. */
  readonly key: string;
  readonly subject: CorrectionSubject;
  readonly unitNumber: number;
  readonly pointCode: string | null;
  /** The one that is changed; null for a new one. */
  readonly given: NewCorrection | null;
  /** What was typed of it before the page was left. */
  readonly values?: CorrectionDraft;
}

export interface CorrectionEditorProps {
  edited: EditedCorrection;
  visit: VisitSummary;
  lot: LotDetail;
  rules: RuleCardContent['corrections'];
  others: readonly { readonly number: number; readonly correction: NewCorrection }[];
  number: number;
  /** The drain test that stands: how the house is drawn. */
  drains: Hold | null;
  onPut: (correction: NewCorrection, another: EditedCorrection | null) => void;
  onDrop: (clientId: string) => void;
  onLeave: () => void;
  /** Told all that is typed, to keep it. */
  onTyped: (typed: TypedCorrection) => void;
}

/** One correction: the place on the house, what, how grave, which section. */
export function CorrectionEditor(props: CorrectionEditorProps): ReactNode {
  const { edited, visit, lot, rules, others, number, drains, onPut, onDrop, onLeave, onTyped } = props;
  const { t } = useTranslation(['outcomes', 'common']);
  const form = useContractForm<CorrectionDraft>(newCorrection, edited.values ?? emptyCorrection(edited));
  const [clientId] = useState(() => edited.given?.clientId ?? crypto.randomUUID());
  const isPhone = useIsPhone();
  const { values } = form;
  useEffect(() => {
    const { subject, unitNumber, pointCode, given } = edited;
    onTyped({ subject, unitNumber, pointCode, given, values });
  }, [onTyped, edited, values]);
  const body = useRef<HTMLDivElement>(null);
  const house = useMemo(
    () => lot.units.find((unit) => unit.number === form.values.unitNumber)?.geometry ?? emptyHouse(),
    [lot.units, form.values.unitNumber],
  );
  const put = (isAnother: boolean): void => {
    const correction = toNewCorrection(form.values, edited, clientId);
    if (!form.check(correction)) {
      focusFirstFault(body.current);
      return;
    }
    onPut(
      newCorrection.parse(correction),
      isAnother ? { ...edited, key: crypto.randomUUID(), given: null, values: undefined } : null,
    );
  };
  const subjectName = edited.subject === 'work' ? t('work.title') : t(`common.systems.${edited.subject}`);
  return (
    <>
      <TaskHead
        onBack={onLeave}
        label={`${t('common.lot', { number: visit.lotNumber })}, ${subjectName}`}
        title={t('correction.number', { number })}
      />
      <div className="correction-editor" ref={body}>
        <CorrectionPlace
          form={form}
          house={house}
          edited={edited}
          others={others}
          number={number}
          drains={drains}
          lot={lot}
          visit={visit}
        />
        <div>
          <CorrectionWhat form={form} rules={rules} />
          <Panel title={t('correction.severity')}>
            <Choice
              label={t('correction.severity')}
              wide
              options={severities.map((value) => ({ value, label: t(`severity.${value}`) }))}
              value={form.values.severity}
              onChange={(severity) => form.set('severity', severity)}
            />
          </Panel>
          <SectionChoice form={form} sections={rules.sections} />
        </div>
      </div>
      <TaskFoot>
        {isPhone ? null : (
          <Act size="lg" kind="text" onClick={onLeave}>
            {t('common.cancel')}
          </Act>
        )}
        {edited.given === null ? (
          <Act size="lg" onClick={() => put(true)}>
            {t('correction.another')}
          </Act>
        ) : (
          <Act size="lg" onClick={() => onDrop(clientId)}>
            {t('correction.drop')}
          </Act>
        )}
        <Act size="lg" kind="first" onClick={() => put(false)}>
          {t(edited.given === null ? 'correction.add' : 'correction.keep')}
        </Act>
      </TaskFoot>
    </>
  );
}

/** After the faults are drawn. */
function focusFirstFault(body: HTMLElement | null): void {
  requestAnimationFrame(() => {
    const fault = body?.querySelector<HTMLElement>('[aria-invalid="true"], .field-error');
    fault?.scrollIntoView({ block: 'center' });
    fault?.focus();
  });
}
