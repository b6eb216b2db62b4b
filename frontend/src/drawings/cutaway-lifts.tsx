import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { CutawayScale } from './cutaway-scale';

/** One section under test at a time, feet above the lowest test plug. */
export interface DrawnLift {
  fromFt: number;
  toFt: number;
}

/** A stack tested by sections: each lift dimensioned beside the stack, one after the other to the right. */
export function Lifts({ lifts, scale }: { lifts: readonly DrawnLift[]; scale: CutawayScale }): ReactNode {
  const { t } = useTranslation('marks');
  const slash = (x: number, y: number): string => `M${x - 3.5} ${y + 3.5}l7-7`;
  return (
    <g>
      {lifts.map(({ fromFt, toFt }, index) => {
        const x = scale.x(22.4 + (index % 3) * 2);
        const [low, high] = [scale.y(fromFt), scale.y(toFt)];
        return (
          <g key={index}>
            <path
              d={`M${x} ${high}V${low}${slash(x, high)}${slash(x, low)}`}
              fill="none"
              stroke="var(--water)"
              strokeWidth="1.3"
            />
            <text className="halo s12 water b" x={x + 4} y={(low + high) / 2 + 4}>
              {t('cutaway.lift', { number: index + 1 })}
            </text>
          </g>
        );
      })}
    </g>
  );
}
