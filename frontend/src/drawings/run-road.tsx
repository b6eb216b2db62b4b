import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { MarkAt, type MarkName } from '../components/mark';
import { Numeral } from '../components/numeral';
import { layOutRoad, type RoadLayout } from './run-road-layout';

export interface RoadStop {
  id: string;
  /** Miles driven from the start when it is reached. */
  atMile: number;
  mark: MarkName;
  /** "Lot 31"; bold. */
  name: string;
  /** "Kettle Rise", after a comma. */
  place?: string;
  /** "11:00 am, up, 3 photos" */
  detail?: ReactNode;
  isNext?: boolean;
  /** Freed or withdrawn: struck. */
  isStruck?: boolean;
}

export interface RoadWindow {
  from: string;
  to: string;
  /** First and last stop inside it. */
  firstStop: string;
  lastStop: string;
}

export interface RunRoadProps {
  /** The whole day's driving. */
  miles: number;
  /** The driven part. */
  drivenMiles: number;
  stops: readonly RoadStop[];
  windows?: readonly RoadWindow[];
  /** Words between stops, such as a break or a leg's minutes: after the stop of that id. */
  asides?: readonly { afterStop: string; text: string }[];
  /** At the foot of the road: "back about 3:10 pm". */
  endWords?: string;
  onOpen?: (id: string) => void;
  /** px; the road grows beyond it when its stops need more. */
  minHeight?: number;
  /** Where no miles are known the edge measures hours: every mile above is then an hour from `fromHour` on. */
  clock?: RoadClock;
}

export interface RoadClock {
  /** The hour of the day at the head of the road. */
  readonly fromHour: number;
  /** Read aloud in place of the miles. */
  readonly name: string;
  readonly here: string;
}

const roadX = 54;

/** One inspector's day as a road drawn to scale: miles ticked, stops hung on it, windows bracketed, the arrow where you are. */
export function RunRoad(props: RunRoadProps): ReactNode {
  const { miles, drivenMiles, stops, windows = [], asides = [], endWords, onOpen, minHeight = 440, clock } = props;
  const { t } = useTranslation('marks');
  const places = stops.map((stop) => ({
    atMile: stop.atMile,
    hasDetail: Boolean(stop.detail),
    hasAside: asides.some((aside) => aside.afterStop === stop.id),
  }));
  const layout = layOutRoad(places, miles, minHeight);
  const yOf = (id: string): number => layout.stops[stops.findIndex((stop) => stop.id === id)] ?? layout.top;
  return (
    <div
      className="road"
      style={{ height: layout.height }}
      role="group"
      aria-label={clock?.name ?? t('road.name', { miles: miles.toFixed(1) })}
    >
      <svg width="210" height={layout.height} viewBox={`0 0 210 ${layout.height}`} aria-hidden="true">
        {clock ? (
          <HourRule layout={layout} hours={miles} fromHour={clock.fromHour} />
        ) : (
          <MileRule layout={layout} miles={miles} />
        )}
        <Tarmac layout={layout} miles={miles} driven={drivenMiles} />
        {stops.map((stop, index) => (
          <Leader key={stop.id} stop={stop} roadY={layout.yOfMile(stop.atMile)} y={layout.stops[index] ?? 0} />
        ))}
        <Here y={layout.yOfMile(drivenMiles)} />
        {endWords ? (
          <path d={`M${roadX + 8} ${layout.yOfMile(miles)}h52`} stroke="var(--ink)" strokeWidth="1.2" />
        ) : null}
      </svg>
      <span className="hidden-words">{clock?.here ?? t('road.here', { miles: drivenMiles.toFixed(1) })}</span>
      <ol>
        {stops.map((stop, index) => (
          <li key={stop.id} style={{ top: (layout.stops[index] ?? 0) - (stop.detail ? 19 : 12) }}>
            <StopWords stop={stop} onOpen={onOpen} />
          </li>
        ))}
      </ol>
      {asides.map((aside) => (
        <span key={aside.afterStop} className="aside" style={{ top: yOf(aside.afterStop) + 22 }}>
          <Numeral text={aside.text} />
        </span>
      ))}
      {endWords ? (
        <span className="aside" style={{ top: layout.yOfMile(miles) - 9 }}>
          <Numeral text={endWords} />
        </span>
      ) : null}
      {windows.map((one) => (
        <WindowBracket key={one.firstStop + one.from} window={one} from={yOf(one.firstStop)} to={yOf(one.lastStop)} />
      ))}
    </div>
  );
}

function MileRule({ layout, miles }: { layout: RoadLayout; miles: number }): ReactNode {
  const { t } = useTranslation('marks');
  const all = Array.from({ length: Math.floor(miles) + 1 }, (_, mile) => mile);
  return (
    <>
      <path
        d={`M.6 ${layout.top}V${layout.yOfMile(miles)}${all.map((mile) => `M0 ${layout.yOfMile(mile)}h${mile % 5 === 0 ? 16 : 8}`).join('')}`}
        fill="none"
        stroke="var(--ink)"
        strokeWidth="1.2"
      />
      {all
        .filter((mile) => mile % 5 === 0)
        .map((mile) => (
          <text key={mile} className="m s12 mid" x="20" y={layout.yOfMile(mile) + 4.5}>
            {mile}
          </text>
        ))}
      <text className="s12 mid" x="20" y={layout.yOfMile(miles) + 20}>
        {t('road.miles')}
      </text>
    </>
  );
}

/** The day's own rule: its hours, a tick every quarter. */
function HourRule({ layout, hours, fromHour }: { layout: RoadLayout; hours: number; fromHour: number }): ReactNode {
  const quarters = Array.from({ length: Math.floor(hours * 4) + 1 }, (_, quarter) => quarter / 4);
  const whole = quarters.filter((hour) => Number.isInteger(hour));
  const ticks = quarters.map((hour) => `M0 ${layout.yOfMile(hour)}h${Number.isInteger(hour) ? 16 : 8}`);
  return (
    <>
      <path
        d={`M.6 ${layout.top}V${layout.yOfMile(hours)}${ticks.join('')}`}
        fill="none"
        stroke="var(--ink)"
        strokeWidth="1.2"
      />
      {whole.map((hour) => (
        <text key={hour} className="m s12 mid" x="20" y={layout.yOfMile(hour) + 4.5}>
          {((fromHour + hour + 11) % 12) + 1}
        </text>
      ))}
    </>
  );
}

function Tarmac({ layout, miles, driven }: { layout: RoadLayout; miles: number; driven: number }): ReactNode {
  const [top, here, end] = [layout.top, layout.yOfMile(driven), layout.yOfMile(miles)];
  return (
    <>
      <rect x={roadX - 5} y={top} width="10" height={end - top} fill="var(--paper)" />
      <rect x={roadX - 5} y={top} width="10" height={Math.max(0, here - top)} fill="var(--ink2)" />
      <g fill="none" stroke="var(--ink)">
        <path d={`M${roadX - 5} ${top}V${end}M${roadX + 5} ${top}V${end}`} strokeWidth="1.5" />
        <path d={`M${roadX} ${here}V${end}`} strokeWidth="1.2" strokeDasharray="5 4" />
        <path d={`M${roadX - 8} ${top}h16M${roadX - 8} ${end}h16`} strokeWidth="2" />
      </g>
    </>
  );
}

function Leader({ stop, roadY, y }: { stop: RoadStop; roadY: number; y: number }): ReactNode {
  const color = stop.isNext ? 'var(--primer)' : 'var(--ink)';
  return (
    <>
      <path d={`M${roadX - 5} ${roadY}H${roadX + 5}`} stroke={color} strokeWidth="3" />
      <path
        d={`M${roadX + 5} ${roadY}H${roadX + 12}L${roadX + 24} ${y}H${roadX + 31}`}
        fill="none"
        stroke={color}
        strokeWidth={stop.isNext ? 2 : 1.2}
      />
      <MarkAt name={stop.mark} x={roadX + 34} y={y - 12} size={24} />
    </>
  );
}

function Here({ y }: { y: number }): ReactNode {
  return <path d={`M${roadX - 13} ${y - 9}h26l-13 15Z`} fill="var(--primer)" stroke="var(--paper)" strokeWidth="2" />;
}

function StopWords({ stop, onOpen }: { stop: RoadStop; onOpen?: (id: string) => void }): ReactNode {
  const { t } = useTranslation('marks');
  const words = (
    <>
      <span className="b name">
        <Numeral text={stop.name} />
      </span>
      {stop.isNext ? `, ${t('road.next')}` : null}
      {stop.place ? `, ${stop.place}` : null}
      <span className="hidden-words">, {t(stop.mark)}</span>
      {stop.detail ? <span className="detail">{stop.detail}</span> : null}
    </>
  );
  const className = `stop ${stop.isNext ? 'next' : ''} ${stop.isStruck ? 'struck' : ''}`;
  if (!onOpen) return <span className={className}>{words}</span>;
  return (
    <button type="button" className={className} onClick={() => onOpen(stop.id)}>
      {words}
    </button>
  );
}

/** A window is a bracket with open sides, never mistaken for a visit. */
function WindowBracket({ window: one, from, to }: { window: RoadWindow; from: number; to: number }): ReactNode {
  return (
    <span className="bracket" style={{ top: from - 17, height: to - from + 34 }}>
      <Numeral text={one.from} />
      <br />
      <Numeral text={one.to} />
    </span>
  );
}
