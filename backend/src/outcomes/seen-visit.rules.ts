import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import { type OutcomeKind, outcomeOf } from '@holdwater/shared-types/outcomes/outcome.states.js';
import { refuse } from '../common/errors/app-error.js';
import type { LotCorrection, SeenResult, SeenVisit } from './outcome.input.js';
import { inputFaults } from './seen-visit.faults.js';

export interface Decision {
  readonly kind: Extract<OutcomeKind, 'pass' | 'fail'>;
  readonly reason: 'not-seen' | null;
}

type OpenCorrection = Pick<LotCorrection, 'unitNumber' | 'subject' | 'severity'>;

/**
 * What a visit that was seen comes to.
 * @throws bad-input, correction-unfixed, answers-missing, fail-needs-a-correction, pass-with-open-correction
 */
export function decideSeen(seen: SeenResult, visit: SeenVisit): Decision {
  const fields = inputFaults(seen, visit);
  if (Object.keys(fields).length > 0) refuse('bad-input', {}, fields);
  requireFixed(seen, visit);
  requireAnswers(seen, visit);
  const open = openAfter(seen, visit);
  requireCorrectionOfFail(seen, open);
  refusePassOverCorrection(seen, open);
  const hasWorkFailed = open.some((each) => each.subject === 'work' && each.severity === 'fix-before-cover');
  return outcomeOf(
    seen.systems.map((each) => each.answer),
    hasWorkFailed,
  );
}

function requireFixed(seen: SeenResult, { corrections }: SeenVisit): void {
  const decided = [...seen.accepted, ...seen.reopened.map((each) => each.correctionId)];
  const unfixed = corrections.find((each) => decided.includes(each.id) && each.state !== 'fixed');
  if (unfixed !== undefined) refuse('correction-unfixed', { number: unfixed.number, is: unfixed.state });
}

function requireAnswers(seen: SeenResult, { stage, unitNumbers }: SeenVisit): void {
  const missing = unitNumbers
    .flatMap((unitNumber) => stage.systems.map((system) => ({ unitNumber, system })))
    .filter(
      ({ unitNumber, system }) =>
        !seen.systems.some((each) => each.unitNumber === unitNumber && each.system === system),
    );
  if (missing.length === 0) return;
  const fields = Object.fromEntries(
    missing.map(({ unitNumber, system }) => [`result.systems.${unitNumber}.${system}`, 'required']),
  );
  refuse('answers-missing', { missing }, fields);
}

/** The corrections of this visit's stage and units that are open once the act is done. */
function openAfter(seen: SeenResult, { corrections, stage, unitNumbers }: SeenVisit): OpenCorrection[] {
  const reopened = seen.reopened.map((each) => each.correctionId);
  const earlier = corrections.filter(
    (each) =>
      each.stageCode === stage.code &&
      unitNumbers.includes(each.unitNumber) &&
      (each.state === 'open' || reopened.includes(each.id)),
  );
  return [...earlier, ...seen.corrections];
}

function requireCorrectionOfFail(seen: SeenResult, open: readonly OpenCorrection[]): void {
  const bare = answered(seen, 'fail').filter((each) => !open.some((correction) => isOn(correction, each)));
  if (bare.length > 0)
    refuse('fail-needs-a-correction', { systems: bare.map(named) }, faultsAt(bare, 'needs-a-correction'));
}

function refusePassOverCorrection(seen: SeenResult, open: readonly OpenCorrection[]): void {
  const grave = open.filter((correction) => correction.severity === 'fix-before-cover');
  const passed = answered(seen, 'pass').filter((each) => grave.some((correction) => isOn(correction, each)));
  if (passed.length > 0)
    refuse('pass-with-open-correction', { systems: passed.map(named) }, faultsAt(passed, 'has-a-correction'));
}

interface Answered {
  readonly index: number;
  readonly unitNumber: number;
  readonly system: System;
}

function answered(seen: SeenResult, answer: 'pass' | 'fail'): Answered[] {
  return seen.systems.map((each, index) => ({ ...each, index })).filter((each) => each.answer === answer);
}

function isOn(correction: OpenCorrection, each: Answered): boolean {
  return correction.unitNumber === each.unitNumber && correction.subject === each.system;
}

function named({ unitNumber, system }: Answered) {
  return { unitNumber, system };
}

function faultsAt(answers: readonly Answered[], why: string): Record<string, string> {
  return Object.fromEntries(answers.map((each) => [`result.systems.${each.index}.answer`, why]));
}
