import type { Caution, FindingParams, Reason } from '@holdwater/shared-types/hydraulics/findings.js';
import type { PlanWay } from '@holdwater/shared-types/plans/plan.contract.js';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../app/session';
import { useFieldWords } from '../../lib/errors';
import { height, measureWords, workedPressure } from '../../lib/units';
import { energy, force, planMeasureWords, volume } from './plan-measures';
import type { PlanStep } from './plan-steps';

/** Pressures of drains are told to a tenth of a psi, those of water lines to a whole one. */
const drainMarkPsi = 0.1;

export interface PlanWords {
  readonly reason: (reason: Reason) => string;
  readonly missing: (missing: PlanWay['missing'][number]) => string;
  readonly caution: (caution: Caution) => string;
  readonly step: (step: PlanStep) => string;
  /** Why a way does not serve: every reason, then every measure that is missing. */
  readonly whyNot: (way: PlanWay) => string[];
}

/** The words of reasons, cautions and steps, numbers in the reader's units. `datumFt`: the lowest test plug, which levels are told from. */
export function usePlanWords(datumFt: number): PlanWords {
  const { t, i18n } = useTranslation(['plans', 'lots', 'common', 'marks']);
  const { units } = useMe();
  const fieldWords = useFieldWords();
  const feet = (value: number): string => measureWords(height(value, units));
  const psi = (value: number, markPsi = 1): string => measureWords(workedPressure(value, markPsi, units));
  const floors = (names: readonly string[]): string =>
    names.map((name) => floorWord(name, (key) => (i18n.exists(key) ? t(key) : null))).join(', ');

  const params = (given: FindingParams): Record<string, string> => {
    const n = (name: string): number => Number(given[name] ?? 0);
    return {
      short: feet(n('shortByFt')),
      name: textOf(given['name']),
      percent: String(Math.ceil(n('loadFraction') * 100)),
      plugPressure: psi(n('pressurePsi'), drainMarkPsi),
      rated: psi(n('ratedPsi'), drainMarkPsi),
      material: materialsOf(given)
        .map((material) => t(`lots.materials.${material}`))
        .join(', '),
      least: psi(n('floorPsi')),
      limit: psi(n('ceilingPsi')),
      has: psi(n('incrementPsi'), n('incrementPsi') || 1),
      needs: psi(n('requiredIncrementPsi'), n('requiredIncrementPsi') || 1),
      range: psi(n('rangePsi')),
      target: psi(n('targetPsi')),
      pressure: psi(n('pressurePsi'), n('pressurePsi') < 10 ? drainMarkPsi : 1),
      energy: planMeasureWords(energy(n('energyFtLbf'), units)),
      force: planMeasureWords(force(n('forceLbf'), units)),
      volume: planMeasureWords(volume(n('volumeGal'), units)),
      floors: floors(Array.isArray(given['floors']) ? given['floors'] : []),
    };
  };
  const reason: PlanWords['reason'] = ({ code, params: given }) => t(`reasons.${code}`, params(given));
  const missing: PlanWords['missing'] = ({ field, code }) => {
    const name = fieldName(field, (key) => (i18n.exists(key) ? t(key) : null));
    return code === 'required'
      ? t('missing.required', { name })
      : t('missing.wrong', { name, why: fieldWords(code) ?? '' });
  };
  return {
    reason,
    missing,
    whyNot: (way) => [...way.reasons.map(reason), ...way.missing.map(missing)],
    caution: ({ code, params: given }) => t(`cautions.${cautionKey(code, given)}`, params(given)),
    step: ({ code, psi: pressure, levelFt, count = 0, minutes = 0 }) =>
      t(`steps.${code}`, {
        count,
        minutes,
        pressure: pressure === undefined ? '' : psi(pressure, code === 'pump-air' ? drainMarkPsi : 1),
        level: levelFt === undefined ? '' : feet(levelFt - datumFt),
      }),
  };
}

const textOf = (value: FindingParams[string] | undefined): string => (typeof value === 'string' ? value : '');

/** A caution with a number it was not given says what it says without it. */
function cautionKey(code: string, given: FindingParams): string {
  if (code === 'compressed-air' && given['energyFtLbf'] === undefined) return 'compressed-air-plain';
  if (code === 'plug-load' && given['forceLbf'] === undefined) return 'plug-load-plain';
  return code;
}

function materialsOf(given: FindingParams): string[] {
  const { material, materials } = given;
  if (Array.isArray(materials)) return materials;
  return typeof material === 'string' && material !== '' ? [material] : [];
}

type Find = (key: string) => string | null;

function floorWord(name: string, find: Find): string {
  if (name.toLowerCase() === 'attic') return find('marks.cutaway.attic') ?? name;
  return find(`marks.cutaway.floor.${name.toLowerCase()}`) ?? name;
}

/** What the house form calls a field, or what the tools do. */
function fieldName(field: string, find: Find): string {
  const last = field.split('.').at(-1) ?? field;
  return find(`plans.fields.${last}`) ?? find(`lots.house.fields.${last}`) ?? last;
}
