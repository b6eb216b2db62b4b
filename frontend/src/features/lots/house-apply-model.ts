import type { ChangedHouseAnswer, ModelledUnit } from '@holdwater/shared-types/lots/house-model.contract.js';

/** What becomes of a house changed on its lot; `leave` keeps it out of the act. */
export const ownHouseAnswers = ['leave', 'keep-changes', 'replace'] as const;
export type OwnHouseAnswer = (typeof ownHouseAnswers)[number];
export type OwnHouseAnswers = Readonly<Record<string, OwnHouseAnswer>>;

export const unitKey = ({ lotId, unitNumber }: Pick<ModelledUnit, 'lotId' | 'unitNumber'>): string =>
  `${lotId} ${unitNumber}`;

export interface WishedUnit {
  lotId: string;
  unitNumber: number;
  whenChanged: ChangedHouseAnswer;
}

/** The units to send: those picked, without those changed on their lot that are left as they are. */
export function wishedUnits(picked: readonly ModelledUnit[], answers: OwnHouseAnswers): WishedUnit[] {
  return picked.flatMap((unit) => {
    const answer = unit.isByHand ? (answers[unitKey(unit)] ?? 'leave') : 'ask';
    return answer === 'leave' ? [] : [{ lotId: unit.lotId, unitNumber: unit.unitNumber, whenChanged: answer }];
  });
}

/** How a unit's house stands to the model, as words' key: `apply.state.<key>`. */
export function unitStanding(unit: ModelledUnit, modelId: string) {
  if (unit.isSame) return 'same';
  if (!unit.isMeasured) return 'unmeasured';
  if (unit.isByHand) return unit.origin === null ? 'byHand' : 'changed';
  if (unit.origin === null) return 'alike';
  return unit.origin.id === modelId ? 'behind' : 'other';
}
