import type { Method, System } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { useFieldWords } from '../../../lib/errors';
import type { ReadTools, ToolField, ToolsDraft } from '../tools-draft';

export interface ToolsFormProps {
  system: System;
  /** What the rule card accepts: only their tools are asked for. */
  acceptedMethods: readonly Method[];
  hasAir: boolean;
  draft: ToolsDraft;
  faults: ReadTools['faults'];
  onChange: (draft: ToolsDraft) => void;
  /** Where sizes and ratings of plugs are kept; null for whoever may not change the house. */
  houseTo: string | null;
}

/** What the plumber brings; the plan is worked out anew as it is typed. */
export function ToolsForm(props: ToolsFormProps): ReactNode {
  const { system, acceptedMethods, hasAir, draft, onChange, houseTo } = props;
  const { t } = useTranslation('plans');
  const has = (method: Method): boolean => acceptedMethods.includes(method);
  return (
    <Panel title={t('tools.title')} side={<span className="s mid">{t('tools.side')}</span>}>
      <div className="fields two">
        {system === 'water' ? (
          <>
            <Tool {...props} name="rangePsi" unit="psi" />
            <Tool {...props} name="incrementPsi" unit="psi" />
          </>
        ) : (
          <Tool {...props} name="fillRateGpm" unit={t('tools.gpm')} isOptional />
        )}
        <Tool {...props} name="waterTempF" unit="°F" />
        {system === 'dwv' && has('laundry-riser') ? <Tool {...props} name="riserIn" unit="in" /> : null}
        {system === 'dwv' && has('sectional') ? <Tool {...props} name="maxSectionFt" unit="ft" /> : null}
        {hasAir ? <Tool {...props} name="airVolumeGal" unit={t('tools.gal')} isOptional /> : null}
      </div>
      {hasAir ? (
        <label className="check-row">
          <input
            type="checkbox"
            checked={draft.makersAllowAir}
            onChange={(event) => onChange({ ...draft, makersAllowAir: event.target.checked })}
          />
          {t('tools.makersAllowAir')}
        </label>
      ) : null}
      {system === 'dwv' && houseTo !== null ? (
        <p className="s mid">
          {t('tools.plugs')} <Link to={houseTo}>{t('tools.house')}</Link>
        </p>
      ) : null}
    </Panel>
  );
}

interface ToolProps extends ToolsFormProps {
  name: ToolField;
  unit: string;
  isOptional?: boolean;
}

function Tool({ name, unit, isOptional, draft, faults, onChange }: ToolProps): ReactNode {
  const { t } = useTranslation('plans');
  const words = useFieldWords();
  return (
    <Field
      label={t(`tools.${name}`)}
      unit={unit}
      isNumeral
      isOptional={isOptional}
      autoComplete="off"
      value={draft[name]}
      error={words(faults[name])}
      onChange={(event) => onChange({ ...draft, [name]: event.target.value })}
    />
  );
}
