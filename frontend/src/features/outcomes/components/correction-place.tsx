import { dwvMethods } from '@holdwater/shared-types/holds/hold.states.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { Cutaway, type TouchPlace } from '../../../drawings/cutaway';
import type { ContractForm } from '../../../lib/use-contract-form';
import type { CorrectionDraft } from '../correction-draft';
import { floorWords } from '../place-words';
import { touchedFloor } from '../touched-floor';
import type { EditedCorrection } from './correction-editor';

export interface CorrectionPlaceProps {
  form: ContractForm<CorrectionDraft>;
  house: HouseGeometry;
  edited: EditedCorrection;
  others: readonly { readonly number: number; readonly correction: NewCorrection }[];
  number: number;
  drains: Hold | null;
  lot: LotDetail;
  visit: VisitSummary;
}

/** Where: touched on the section, or the whole system; floor and room in words. */
export function CorrectionPlace({
  form,
  house,
  edited,
  others,
  number,
  drains,
  lot,
  visit,
}: CorrectionPlaceProps): ReactNode {
  const { t } = useTranslation(['outcomes', 'marks']);
  const { place, floor, room, unitNumber } = form.values;
  const fault = form.faultOf('place');
  const touched = place === null || place === 'whole-system' ? null : place;
  const known = others.flatMap(({ number: other, correction }) =>
    correction.place === 'whole-system' ||
    correction.clientId === edited.given?.clientId ||
    correction.unitNumber !== unitNumber
      ? []
      : [{ number: other, state: 'open' as const, ...correction.place }],
  );
  const touch = (next: TouchPlace): void => {
    form.set('place', next);
    form.set('floor', touchedFloor(house, next) ?? '');
  };
  return (
    <Panel title={t('correction.where')} side={<span className="s mid">{t('correction.touch')}</span>}>
      {visit.unitNumbers.length > 1 && edited.subject === 'work' ? (
        <Choice
          label={t('correction.unit')}
          wide
          options={lot.units
            .filter((unit) => visit.unitNumbers.includes(unit.number))
            .map((unit) => ({ value: String(unit.number), label: unit.label }))}
          value={String(unitNumber)}
          onChange={(unit) => form.set('unitNumber', Number(unit))}
        />
      ) : null}
      <Cutaway
        house={house}
        method={dwvMethods.find((one) => one === drains?.method) ?? null}
        fillLevelFt={drains?.fillLevelFt ?? null}
        view={edited.subject === 'water' ? 'water' : 'dwv'}
        hasLabels={false}
        maxHeight={330}
        corrections={touched === null ? known : [...known, { number, state: 'open', ...touched }]}
        touched={touched}
        onTouch={touch}
      />
      <div className="fields">
        <label className="whole row">
          <input
            type="checkbox"
            checked={place === 'whole-system'}
            onChange={(event) => form.set('place', event.target.checked ? 'whole-system' : null)}
          />
          {t('correction.wholeSystem')}
        </label>
        {fault === undefined ? null : (
          <p className="field-error" role="alert" tabIndex={-1}>
            {t('correction.placeMissing')}
          </p>
        )}
        <div className="fields two">
          <Field label={t('correction.floor')} labelPlace="inside" isOptional error={form.faultOf('floor')}>
            {(control) => (
              <select {...control} value={floor} onChange={(event) => form.set('floor', event.target.value)}>
                <option value="">{t('correction.noFloor')}</option>
                {house.floors.map(({ name }) => (
                  <option key={name} value={name}>
                    {floorWords(t, name)}
                  </option>
                ))}
              </select>
            )}
          </Field>
          <Field
            label={t('correction.room')}
            labelPlace="inside"
            isOptional
            maxLength={60}
            autoComplete="off"
            value={room}
            error={form.faultOf('room')}
            onChange={(event) => form.set('room', event.target.value)}
          />
        </div>
      </div>
    </Panel>
  );
}
