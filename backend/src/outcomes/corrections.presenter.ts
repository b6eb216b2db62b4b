import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { Actor } from '../common/access/actor.js';
import type { CorrectionRow } from './corrections.queries.js';
import { correctionAbilities } from './outcomes.policy.js';

/** A correction as this reader sees it, with what they may do to it now. */
export function presentCorrection(actor: Actor, row: CorrectionRow): Correction {
  const { builderId, plumberId, departmentId, mayPlumberRequest, openedAt, fixedAt, acceptedAt, ...shown } = row;
  return {
    ...shown,
    openedAt: openedAt.toISOString(),
    fixedAt: fixedAt?.toISOString() ?? null,
    acceptedAt: acceptedAt?.toISOString() ?? null,
    abilities: correctionAbilities(actor, { builderId, plumberId, departmentId, mayPlumberRequest }, row.state),
  };
}
