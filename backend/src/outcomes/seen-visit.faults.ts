import type { SeenResult, SeenVisit } from './outcome.input.js';

type Fields = Record<string, string>;

/** What of an outcome does not fit its visit, by path: systems nobody asks for, units of other visits, points the card does not know. */
export function inputFaults(seen: SeenResult, visit: SeenVisit): Fields {
  return {
    ...systemFaults(seen, visit),
    ...pointFaults(seen, visit),
    ...correctionFaults(seen, visit),
    ...decidedFaults(seen, visit),
  };
}

function systemFaults(seen: SeenResult, { stage, unitNumbers }: SeenVisit): Fields {
  const fields: Fields = {};
  seen.systems.forEach((each, index) => {
    const path = `result.systems.${index}`;
    if (!unitNumbers.includes(each.unitNumber)) fields[`${path}.unitNumber`] = 'not-of-this-visit';
    if (!stage.systems.includes(each.system)) fields[`${path}.system`] = 'not-of-this-stage';
    const first = seen.systems.findIndex(
      (other) => other.unitNumber === each.unitNumber && other.system === each.system,
    );
    if (first !== index) fields[path] = 'named-twice';
    const isLevel = typeof each.levelIn === 'number';
    if (isLevel && each.system === 'water') fields[`${path}.levelIn`] = 'not-for-a-gauge';
    else if (isLevel && typeof each.pressurePsi === 'number') fields[`${path}.levelIn`] = 'level-or-pressure';
  });
  return fields;
}

function pointFaults(seen: SeenResult, { stage }: SeenVisit): Fields {
  const fields: Fields = {};
  seen.lookedAt.forEach((code, index) => {
    if (!isPoint(code, stage)) fields[`result.lookedAt.${index}`] = 'unknown-point';
  });
  return fields;
}

function correctionFaults(seen: SeenResult, { stage, unitNumbers }: SeenVisit): Fields {
  const fields: Fields = {};
  seen.corrections.forEach((each, index) => {
    const path = `result.corrections.${index}`;
    if (!unitNumbers.includes(each.unitNumber)) fields[`${path}.unitNumber`] = 'not-of-this-visit';
    const isSubject = each.subject === 'work' || stage.systems.includes(each.subject);
    if (!isSubject) fields[`${path}.subject`] = 'not-of-this-stage';
    const { pointCode } = each;
    if (typeof pointCode === 'string' && !isPoint(pointCode, stage)) fields[`${path}.pointCode`] = 'unknown-point';
    const first = seen.corrections.findIndex((other) => other.clientId === each.clientId);
    if (first !== index) fields[`${path}.clientId`] = 'named-twice';
  });
  return fields;
}

function decidedFaults(seen: SeenResult, { corrections }: SeenVisit): Fields {
  const fields: Fields = {};
  const named = new Set<string>();
  const check = (id: string, path: string) => {
    if (!corrections.some((each) => each.id === id)) fields[path] = 'unknown-correction';
    else if (named.has(id)) fields[path] = 'named-twice';
    named.add(id);
  };
  seen.accepted.forEach((id, index) => check(id, `result.accepted.${index}`));
  seen.reopened.forEach((each, index) => check(each.correctionId, `result.reopened.${index}.correctionId`));
  return fields;
}

function isPoint(code: string, stage: SeenVisit['stage']): boolean {
  return stage.work.some((point) => point.code === code);
}
