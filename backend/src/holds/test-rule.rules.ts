import type { RuleCardContent, Stage, TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Medium, Method, System } from '@holdwater/shared-types/holds/hold.states.js';
import { refuse } from '../common/errors/app-error.js';
import { isLevelTest } from './reading.rules.js';

export interface ChosenTest {
  readonly stageCode: string;
  readonly system: System;
  readonly method: Method;
  readonly medium: Medium;
  readonly gauge?: unknown;
  readonly tape?: unknown;
}

/** What a test takes over from the rule card it is started under. */
export interface TestTerms {
  readonly minimumPsi: number | null;
  readonly settleMinutes: number;
}

/** @throws stage-unknown */
export function getStage(content: RuleCardContent, stageCode: string): Stage {
  return content.stages.find((stage) => stage.code === stageCode) ?? refuse('stage-unknown', { stageCode });
}

/**
 * Checks a chosen test against the rule card and gives its terms.
 * @throws stage-unknown, bad-input (a system the stage does not require; gauge or tape left out), method-not-accepted
 */
export function termsOf(content: RuleCardContent, chosen: ChosenTest): TestTerms {
  const rule = findTestRule(content, chosen);
  if (rule === undefined) return refuse('bad-input', {}, { system: 'not-of-this-stage' });
  if (!rule.acceptedMethods.includes(chosen.method)) {
    refuse('method-not-accepted', { acceptedMethods: rule.acceptedMethods }, { method: 'method-not-accepted' });
  }
  const minimumPsi = minimumOf(rule, chosen);
  const instrument = isLevelTest(chosen) ? 'tape' : 'gauge';
  if (!chosen[instrument]) refuse('bad-input', {}, { [instrument]: 'required' });
  return { minimumPsi, settleMinutes: rule.settleMinutes };
}

function findTestRule(content: RuleCardContent, chosen: ChosenTest): TestRule | undefined {
  if (!getStage(content, chosen.stageCode).systems.includes(chosen.system)) return undefined;
  return content.tests.find((rule) => rule.stageCode === chosen.stageCode && rule.system === chosen.system);
}

/** The medium belongs to the method: air by air, the other drain methods by water, a gauge by whatever the card gives a pressure for. */
function minimumOf(rule: TestRule, chosen: ChosenTest): number | null {
  const isFitting = chosen.system === 'water' || (chosen.method === 'air') === (chosen.medium === 'air');
  const isOdd = chosen.system === 'dwv' && chosen.medium === 'water-topped-with-air';
  const pressure = rule.pressures.find((each) => each.medium === chosen.medium);
  const isAccepted = isFitting && !isOdd && (isLevelTest(chosen) || pressure !== undefined);
  if (!isAccepted) {
    refuse(
      'method-not-accepted',
      { acceptedMedia: rule.pressures.map((each) => each.medium) },
      { medium: 'medium-not-accepted' },
    );
  }
  return isLevelTest(chosen) ? null : (pressure?.minimumPsi ?? null);
}
