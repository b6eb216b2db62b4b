import type { ReactNode } from 'react';
import { Icon } from './icon';
import { Mark } from './mark';

export interface CautionProps {
  children: ReactNode;
  /** Over the lowest-rated part: the red headline that stands alone. */
  isOver?: boolean;
}

/** A caution sits by its number: an open octagon, never a triangle (that is a correction). */
export function Caution({ children, isOver = false }: CautionProps): ReactNode {
  if (isOver) {
    return (
      <div className="caution over" role="alert">
        <Mark name="test-over" size={28} />
        <div>{children}</div>
      </div>
    );
  }
  return (
    <div className="caution">
      <Icon name="caution" size={18} />
      <div>{children}</div>
    </div>
  );
}
