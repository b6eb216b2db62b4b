import type { CorrectionState } from '@holdwater/shared-types/outcomes/correction.states.js';
import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import { useMemo, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { MarkAt } from '../components/mark';
import { Callouts } from './cutaway-callouts';
import { FeetRule, HeadChain } from './cutaway-chain';
import { headRows, type PlanLevel } from './cutaway-heads';
import { drawHouse, type CutawayHouse } from './cutaway-house';
import { Lifts, type DrawnLift } from './cutaway-lifts';
import { AtticCut, isCut, LaundryBox, LevelLine, TestPlug } from './cutaway-level';
import { Pipes } from './cutaway-pipes';
import { runsOf } from './cutaway-runs';
import { cutawayScale, type CutawayScale } from './cutaway-scale';
import { Structure } from './cutaway-structure';
import { CutawayTwin } from './cutaway-twin';
import { cutawayUnits } from './cutaway-units';
import { WaterLines } from './cutaway-water';
import { usePatterns } from './patterns';
import { TouchSurface, type TouchPlace } from './touch-surface';
import { useDrawnWidth } from './use-drawn-width';
import type { Units } from '../lib/units';

export type { CutawayHouse } from './cutaway-house';
export type { TouchPlace } from './touch-surface';

export interface CutawayProps {
  house: CutawayHouse;
  /** Null while no method is chosen: the pipes are drawn empty. */
  method: DwvMethod | null;
  /** Where the water stands or is to stand, feet above the finished first floor; null for air or none. */
  fillLevelFt: number | null;
  /** The plan's answer; without it heads are worked out at 0.433 psi per foot. */
  levels?: readonly PlanLevel[];
  /** By sections: each lift, feet above the finished first floor. */
  lifts?: readonly DrawnLift[] | null;
  view?: 'dwv' | 'water';
  units?: Units;
  /** The rule of feet, the chain of heads and the callouts. */
  hasLabels?: boolean;
  /** Places are fractions of the drawing's frame, labels or not. */
  corrections?: readonly ({ number: number; state: CorrectionState } & TouchPlace)[];
  photos?: readonly ({ number: number } & TouchPlace)[];
  /** Lets a place be touched; `touched` rings it. */
  onTouch?: (place: TouchPlace) => void;
  touched?: TouchPlace | null;
  /** px; the drawing takes the width of its place. */
  maxHeight?: number;
}

/** A section through the house with its drains, the water in them, and what is not under test hatched. */
export function Cutaway(props: CutawayProps): ReactNode {
  const { house, method, fillLevelFt, levels = [], view = 'dwv', hasLabels = true, maxHeight = 460 } = props;
  const { t } = useTranslation('marks');
  const units = cutawayUnits(props.units ?? 'us');
  const [place, width] = useDrawnWidth(560);
  const drawn = useMemo(() => drawHouse(house), [house]);
  const scale = useMemo(() => cutawayScale(drawn, width, maxHeight, hasLabels), [drawn, width, maxHeight, hasLabels]);
  const patterns = usePatterns(['not-under-test', 'soil']);
  const isAir = method === 'air';
  // Tested by a standpipe before the house stands.
  const isGroundwork = method === 'standpipe';
  const isWaterView = view === 'water';
  const levelFt = method === null || isAir || fillLevelFt === null ? null : fillLevelFt - drawn.datumFt;
  const runs = useMemo(() => runsOf(drawn, method, levelFt), [drawn, method, levelFt]);
  const plug = [...house.plugs].sort((a, b) => a.elevationFt - b.elevationFt)[0] ?? null;
  const rows =
    isWaterView || method === null
      ? []
      : headRows(
          isGroundwork ? { ...drawn, floors: drawn.floors.slice(0, 1), atticFt: Infinity } : drawn,
          levelFt,
          levels,
          plug?.name ?? null,
        );
  const isBare = levelFt !== null && method !== 'sectional' && !isGroundwork && levelFt < drawn.ventFt - 0.05;
  const name =
    levelFt !== null
      ? t('cutaway.waterLevel', { level: `${units.length(levelFt)} ${units.lengthUnit}` })
      : t(isAir ? 'cutaway.underAir' : 'cutaway.noTest');
  const hatchFill = patterns.fill('not-under-test');
  const lifts = (props.lifts ?? []).map(({ fromFt, toFt }) => ({
    fromFt: fromFt - drawn.datumFt,
    toFt: toFt - drawn.datumFt,
  }));
  const isRoomy = hasLabels && width >= 480;
  return (
    <figure className="drawing" ref={place}>
      <svg
        width={width}
        height={scale.height}
        viewBox={`0 0 ${width} ${scale.height}`}
        aria-label={name}
        role={props.onTouch ? 'group' : 'img'}
      >
        {patterns.defs}
        <Structure house={drawn} scale={scale} soilFill={patterns.fill('soil')} isGroundwork={isGroundwork} />
        {isWaterView || isGroundwork ? null : (
          <WaterLines house={drawn} scale={scale} isOwnView={false} gaugeFt={null} />
        )}
        <Pipes runs={runs} scale={scale} levelFt={levelFt} isAir={isAir} isPale={isWaterView} hatchFill={hatchFill} />
        {isGroundwork ? null : <LaundryBox house={drawn} scale={scale} />}
        <TestPlug scale={scale} hatchFill={hatchFill} />
        {isWaterView ? (
          <WaterLines house={drawn} scale={scale} isOwnView gaugeFt={gaugeOf(house, drawn.datumFt)} />
        ) : null}
        {levelFt === null || isWaterView ? null : <LevelLine scale={scale} levelFt={levelFt} />}
        {isCut(method) && !isWaterView && drawn.cutFt !== null ? <AtticCut scale={scale} cutFt={drawn.cutFt} /> : null}
        {lifts.length > 1 && !isWaterView ? <Lifts lifts={lifts} scale={scale} /> : null}
        {hasLabels ? <FeetRule house={drawn} scale={scale} units={units} /> : null}
        {hasLabels ? (
          <HeadChain rows={rows} scale={scale} levelFt={isWaterView ? null : levelFt} units={units} />
        ) : null}
        {isRoomy && !isWaterView ? (
          <Callouts
            house={drawn}
            scale={scale}
            method={method}
            levelFt={levelFt}
            plugSizeIn={plug?.nominalIn ?? null}
          />
        ) : null}
        <Keys {...props} scale={scale} />
        {props.onTouch ? (
          <TouchSurface frame={scale.frame} place={props.touched ?? null} onTouch={props.onTouch} />
        ) : null}
      </svg>
      <CutawayTwin
        rows={rows}
        bare={isBare && levelFt !== null ? { fromFt: levelFt, toFt: drawn.ventFt } : null}
        lifts={lifts}
        units={units}
      />
      <KeyWords {...props} />
    </figure>
  );
}

function gaugeOf(house: CutawayHouse, datumFt: number): number | null {
  const elevation = house.gaugeFt ?? null;
  return elevation === null ? null : elevation - datumFt;
}

/** Correction triangles, photo numbers, and the ring round a place just touched. */
function Keys({ corrections = [], photos = [], touched, scale }: CutawayProps & { scale: CutawayScale }): ReactNode {
  const { frame } = scale;
  const at = (place: TouchPlace): [number, number] => [
    frame.left + place.x * frame.width,
    frame.top + place.y * frame.height,
  ];
  return (
    <g>
      {touched ? (
        <circle
          cx={at(touched)[0]}
          cy={at(touched)[1]}
          r="21"
          fill="none"
          stroke="var(--red)"
          strokeWidth="2"
          strokeDasharray="5 3"
        />
      ) : null}
      {photos.map((photo) => (
        <MarkAt
          key={`p${photo.number}`}
          name="photo"
          number={photo.number}
          x={at(photo)[0] - 10}
          y={at(photo)[1] - 10}
        />
      ))}
      {corrections.map((one) => {
        const [x, y] = at(one);
        return (
          <g key={`c${one.number}`}>
            <path d={`M${x} ${y - 13}l13 24h-26z`} fill="var(--paper)" stroke="var(--paper)" strokeWidth="3" />
            <MarkAt name={`correction-${one.state}`} number={one.number} size={23} x={x - 11.5} y={y - 12} />
          </g>
        );
      })}
    </g>
  );
}

function KeyWords({ corrections = [], photos = [] }: CutawayProps): ReactNode {
  const { t } = useTranslation('marks');
  if (corrections.length + photos.length === 0) return null;
  return (
    <ul className="hidden-words">
      {corrections.map((one) => (
        <li key={`c${one.number}`}>
          {t('cutaway.correctionAt', { number: one.number, state: t(`correction-${one.state}`) })}
        </li>
      ))}
      {photos.map((photo) => (
        <li key={`p${photo.number}`}>{t('cutaway.photoAt', { number: photo.number })}</li>
      ))}
    </ul>
  );
}
