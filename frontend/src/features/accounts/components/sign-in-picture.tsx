import type { ReactNode } from 'react';
import { Cutaway } from '../../../drawings/cutaway';
import { signInHouse } from './sign-in-house';

/** What the product is about, drawn large: a house that holds water. */
export function SignInPicture({ isSmall }: { isSmall: boolean }): ReactNode {
  return (
    <Cutaway
      house={signInHouse}
      method="attic-cut"
      fillLevelFt={signInHouse.atticCutFt}
      maxHeight={isSmall ? 320 : 820}
      hasLabels={!isSmall}
    />
  );
}
