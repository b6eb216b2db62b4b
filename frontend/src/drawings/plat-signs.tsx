import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { polygonPath, scaleBarFt, type PlatPoint } from './plat-geometry';

/** The centre line of a road with its name along the longest straight of it. */
export function PlatRoad({ name, line }: { name: string; line: readonly PlatPoint[] }): ReactNode {
  let longest = { length: 0, x: 0, y: 0, degrees: 0 };
  line.slice(1).forEach(([x1, y1], index) => {
    const [x0, y0] = line[index] ?? [x1, y1];
    const length = Math.hypot(x1 - x0, y1 - y0);
    if (length <= longest.length) return;
    const raw = (Math.atan2(y1 - y0, x1 - x0) * 180) / Math.PI;
    const degrees = raw > 90 ? raw - 180 : raw <= -90 ? raw + 180 : raw;
    longest = { length, x: (x0 + x1) / 2, y: (y0 + y1) / 2, degrees };
  });
  return (
    <g aria-hidden="true" pointerEvents="none">
      <path d={polygonPath(line, false)} fill="none" stroke="var(--rule2)" strokeDasharray="14 4 3 4" />
      <text
        className="street halo"
        textAnchor="middle"
        transform={`translate(${longest.x} ${longest.y + 5}) rotate(${longest.degrees} 0 -5)`}
      >
        {name}
      </text>
    </g>
  );
}

/** A bar of a round number of feet. */
export function ScaleBar({ x, y, pxPerFt }: { x: number; y: number; pxPerFt: number }): ReactNode {
  const { t } = useTranslation('marks');
  const feet = scaleBarFt(pxPerFt);
  const quarter = (feet * pxPerFt) / 4;
  return (
    <g aria-hidden="true">
      <path
        d={`M${x} ${y}h${quarter * 4}M${x} ${y}v-7M${x + quarter} ${y}v-4M${x + quarter * 2} ${y}v-7M${x + quarter * 3} ${y}v-4M${x + quarter * 4} ${y}v-7`}
        fill="none"
        stroke="var(--ink)"
        strokeWidth="1.2"
      />
      <path d={`M${x} ${y}h${quarter}M${x + quarter * 2} ${y}h${quarter}`} stroke="var(--ink)" strokeWidth="4" />
      <text className="m s12" x={x} y={y - 12}>
        0
      </text>
      <text className="m s12" x={x + quarter * 2} y={y - 12} textAnchor="middle">
        {feet / 2}
      </text>
      <text className="m s12" x={x + quarter * 4} y={y - 12} textAnchor="middle">
        {t('plat.feet', { count: feet })}
      </text>
    </g>
  );
}

/** The arrow to north. */
export function North({ x, y, degrees }: { x: number; y: number; degrees: number }): ReactNode {
  const { t } = useTranslation('marks');
  return (
    <g aria-hidden="true" transform={`translate(${x} ${y})`}>
      <g transform={`rotate(${degrees})`} fill="none" stroke="var(--ink)">
        <path d="M0 20V-16M-6 -4 0 -18 6 -4" strokeWidth="1.4" />
        <path d="M-10 7H10" strokeWidth="1.2" />
      </g>
      <text className="s12 b" x="12" y="-8">
        {t('plat.north')}
      </text>
    </g>
  );
}
