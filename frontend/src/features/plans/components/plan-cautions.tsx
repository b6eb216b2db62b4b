import type { Caution as CautionFinding } from '@holdwater/shared-types/hydraulics/findings.js';
import type { ReactNode } from 'react';
import { Caution } from '../../../components/caution';
import { Numeral } from '../../../components/numeral';
import type { PlanWords } from '../plan-words';
import { cautionsAt, type CautionPlace } from '../shown-plan';

export interface PlanCautionsProps {
  cautions: readonly CautionFinding[];
  place: CautionPlace;
  words: PlanWords;
}

/** The cautions that concern the numbers they stand beside. */
export function PlanCautions({ cautions, place, words }: PlanCautionsProps): ReactNode {
  const here = cautionsAt(cautions, place);
  if (here.length === 0) return null;
  return (
    <div className="plan-cautions">
      {here.map((caution, index) => (
        <Caution key={`${caution.code} ${index}`}>
          <Numeral text={words.caution(caution)} />
        </Caution>
      ))}
    </div>
  );
}
