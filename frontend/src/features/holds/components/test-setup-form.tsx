import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Caution } from '../../../components/caution';
import { Choice } from '../../../components/choice';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { isLevelTest } from '../standing-tests';
import {
  mediaFor,
  minimumFor,
  tooCoarse,
  withMedium,
  withMethod,
  type SetupDraft,
  type SetupFaults,
  type SetupField,
} from '../test-setup';
import { useFaultWords } from '../use-fault-words';

export interface TestSetupFormProps {
  rule: TestRule;
  ruleCard: Pick<RuleCard, 'version'>;
  house: HouseGeometry | null;
  /** "test 2" */
  title: string;
  draft: SetupDraft;
  /** Shown once the act was tried. */
  faults: SetupFaults;
  onChange: (draft: SetupDraft) => void;
}

/** How a test is put up: a way the rule card accepts, and what it is read with. */
export function TestSetupForm(props: TestSetupFormProps): ReactNode {
  const { rule, ruleCard, house, title, draft, faults, onChange } = props;
  const { t } = useTranslation(['holds', 'common']);
  const words = useFaultWords();
  const media = mediaFor(rule, draft.method);
  const isLevel = draft.medium !== null && isLevelTest({ system: rule.system, medium: draft.medium });
  return (
    <Panel title={title} side={<span className="s mid">{t('common.ruleCard', { version: ruleCard.version })}</span>}>
      <div className="fields">
        {rule.system === 'dwv' ? (
          <Choice
            label={t('setup.method')}
            isLabelShown
            stacked
            wide
            options={rule.acceptedMethods.map((value) => ({ value, label: t(`methods.${value}`) }))}
            value={draft.method}
            onChange={(method) => onChange(withMethod(draft, method, rule, house))}
          />
        ) : null}
        <Fault words={words(faults.method)} />
        {media.length > 1 ? (
          <Choice
            label={t('setup.medium')}
            isLabelShown
            stacked
            wide
            options={media.map((value) => ({
              value,
              label: t('setup.mediumNeeds', { medium: t(`media.${value}`), psi: minimumFor(rule, value) ?? 0 }),
            }))}
            value={draft.medium}
            onChange={(medium) => onChange(withMedium(draft, medium, house))}
          />
        ) : null}
        <Fault words={words(faults.medium)} />
        {draft.medium === null ? null : isLevel ? <LevelTools {...props} /> : <GaugeTools {...props} />}
      </div>
    </Panel>
  );
}

function Fault({ words }: { words: string | undefined }): ReactNode {
  return words === undefined ? null : (
    <p className="field-error" role="alert">
      {words}
    </p>
  );
}

function GaugeTools(props: TestSetupFormProps): ReactNode {
  const { rule, ruleCard, draft } = props;
  const { t } = useTranslation('holds');
  const coarse = tooCoarse(draft, rule);
  return (
    <>
      <div className="fields two">
        <Tool {...props} field="rangePsi" label={t('setup.range')} unit="psi" />
        <Tool {...props} field="incrementPsi" label={t('setup.increment')} unit="psi" />
        <Tool
          {...props}
          field="ceilingPsi"
          label={t('setup.ceiling')}
          unit="psi"
          isOptional
          hint={t('setup.ceilingHint')}
        />
      </div>
      {coarse === null ? null : <Caution>{t('setup.tooCoarse', { version: ruleCard.version, psi: coarse })}</Caution>}
      {rule.measuredAt === 'highest-outlet' ? <p className="s mid">{t('setup.atHighestOutlet')}</p> : null}
    </>
  );
}

function LevelTools(props: TestSetupFormProps): ReactNode {
  const { t } = useTranslation('holds');
  return (
    <div className="fields two">
      <Tool {...props} field="fillLevelFt" label={t('setup.fillLevel')} unit="ft" hint={t('setup.fillLevelHint')} />
      <Tool {...props} field="incrementIn" label={t('setup.tapeMark')} unit="in" />
    </div>
  );
}

interface ToolProps extends TestSetupFormProps {
  field: Exclude<SetupField, 'method' | 'medium'>;
  label: string;
  unit: string;
  hint?: string;
  isOptional?: boolean;
}

function Tool({ field, label, unit, hint, isOptional, draft, faults, onChange }: ToolProps): ReactNode {
  const words = useFaultWords();
  return (
    <Field
      label={label}
      labelPlace="inside"
      unit={unit}
      isNumeral
      isOptional={isOptional}
      hint={hint}
      autoComplete="off"
      value={draft[field]}
      error={words(faults[field])}
      onChange={(event) => onChange({ ...draft, [field]: event.target.value })}
    />
  );
}
