import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { plugFt, stackFt, type DrawnHouse } from './cutaway-house';
import type { CutawayScale, Feet } from './cutaway-scale';

interface CalloutsProps {
  house: DrawnHouse;
  scale: CutawayScale;
  method: DwvMethod | null;
  levelFt: number | null;
  plugSizeIn: number | null;
}

/** Words on the drawing, each with its leader. */
export function Callouts({ house, scale, method, levelFt, plugSizeIn }: CalloutsProps): ReactNode {
  const { t } = useTranslation('marks');
  const lowest = house.floors[0]?.heightFt ?? 3;
  const plug = plugSizeIn === null ? t('cutaway.plug') : t('cutaway.plugSized', { inches: plugSizeIn });
  const plugCallout = <Callout scale={scale} from={[plugFt + 0.2, -0.5]} to={[5, -1.9]} word={plug} />;
  if (method === 'standpipe') {
    return (
      <>
        {plugCallout}
        <Callout scale={scale} from={[5.5, lowest + 4]} to={[7.4, lowest + 4.6]} word={t('cutaway.standpipe')} />
      </>
    );
  }
  const isVentBare = levelFt !== null && levelFt < house.ventFt - 0.3;
  const ventTextFt = Math.min(house.ridgeFt + 0.2, house.ventFt + 1.2);
  return (
    <>
      {plugCallout}
      {isVentBare ? (
        <Callout
          scale={scale}
          from={[stackFt + 0.3, house.ventFt - 0.7]}
          to={[24.6, ventTextFt]}
          word={t('cutaway.ventAbove')}
          second={t('cutaway.vent')}
        />
      ) : null}
      {method === 'attic-cut' && house.cutFt !== null ? (
        <Callout
          scale={scale}
          from={[stackFt - 0.6, house.cutFt + 0.4]}
          to={[9.6, house.ridgeFt]}
          word={t('cutaway.cut')}
          isEnd
        />
      ) : null}
      <Callout scale={scale} from={[stackFt + 0.4, lowest + 5.6]} to={[23, lowest + 6.2]} word={t('cutaway.stack')} />
      <Callout scale={scale} from={[22.9, lowest + 1.1]} to={[24, lowest + 2.4]} word={t('cutaway.cleanout')} />
      <LaundryWords house={house} scale={scale} levelFt={levelFt} method={method} />
    </>
  );
}

type LaundryProps = Pick<CalloutsProps, 'house' | 'scale' | 'levelFt' | 'method'>;

function LaundryWords({ house, scale, levelFt, method }: LaundryProps): ReactNode {
  const { t } = useTranslation('marks');
  const outlet = house.laundryOutletFt;
  if (outlet === null) return null;
  if (method === 'laundry-riser' && levelFt !== null) {
    return (
      <Callout scale={scale} from={[9.5, levelFt + 0.1]} to={[8.4, levelFt + 1.6]} word={t('cutaway.riser')} isEnd />
    );
  }
  const isPlugged = levelFt !== null && levelFt > outlet + 0.05;
  return (
    <text className="halo s12 med" x={scale.x(5.75)} y={scale.y(outlet + 2.6)}>
      {t('cutaway.laundry')}
      {method === 'laundry-box' ? (
        <tspan className="mut" x={scale.x(5.75)} dy="14">
          {t('cutaway.knockedOut')}
        </tspan>
      ) : null}
      {isPlugged ? (
        <tspan className="mut" x={scale.x(5.75)} dy="14">
          {t('cutaway.plugged')}
        </tspan>
      ) : null}
    </text>
  );
}

interface CalloutProps {
  scale: CutawayScale;
  from: Feet;
  to: Feet;
  word: string;
  second?: string;
  isEnd?: boolean;
}

function Callout({ scale, from, to, word, second, isEnd = false }: CalloutProps): ReactNode {
  const [x1, y1] = [scale.x(from[0]), scale.y(from[1])];
  const [x2, y2] = [scale.x(to[0]), Math.max(12, scale.y(to[1]))];
  return (
    <g>
      <path d={`M${x1} ${y1}L${x2 + (isEnd ? 3 : -3)} ${y2 - 4}`} stroke="var(--ink)" strokeWidth=".8" />
      <circle cx={x1} cy={y1} r="1.9" fill="var(--ink)" />
      <text className="halo s12 med" x={x2} y={y2} textAnchor={isEnd ? 'end' : 'start'}>
        {word}
        {second ? (
          <tspan className="mut" x={x2} dy="14">
            {second}
          </tspan>
        ) : null}
      </text>
    </g>
  );
}
