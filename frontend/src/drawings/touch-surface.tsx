import { useState, type KeyboardEvent, type MouseEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';

/** A place on a drawing as fractions of its frame, from the upper left. */
export interface TouchPlace {
  x: number;
  y: number;
}

interface TouchSurfaceProps {
  frame: { left: number; top: number; width: number; height: number };
  place: TouchPlace | null;
  onTouch: (place: TouchPlace) => void;
}

const step = 0.02;

function clamp(value: number): number {
  return Math.round(Math.min(1, Math.max(0, value)) * 1000) / 1000;
}

/** Takes a touch on a drawing; by keyboard a cross is moved with the arrow keys and set with Enter. */
export function TouchSurface({ frame, place, onTouch }: TouchSurfaceProps): ReactNode {
  const { t } = useTranslation('marks');
  const [cross, setCross] = useState<TouchPlace | null>(null);
  const shown = cross ?? place ?? { x: 0.5, y: 0.5 };
  const touch = (event: MouseEvent<SVGRectElement>): void => {
    const box = event.currentTarget.getBoundingClientRect();
    setCross(null);
    if (box.width === 0 || box.height === 0) return;
    onTouch({ x: clamp((event.clientX - box.left) / box.width), y: clamp((event.clientY - box.top) / box.height) });
  };
  const move = (event: KeyboardEvent<SVGRectElement>): void => {
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      onTouch(shown);
      return;
    }
    const ways: Record<string, [number, number]> = {
      ArrowLeft: [-1, 0],
      ArrowRight: [1, 0],
      ArrowUp: [0, -1],
      ArrowDown: [0, 1],
    };
    const way = ways[event.key];
    if (!way) return;
    event.preventDefault();
    setCross({ x: clamp(shown.x + way[0] * step), y: clamp(shown.y + way[1] * step) });
  };
  const [x, y] = [frame.left + shown.x * frame.width, frame.top + shown.y * frame.height];
  return (
    <>
      {cross ? <path d={`M${x - 12} ${y}h24M${x} ${y - 12}v24`} stroke="var(--primer)" strokeWidth="2" /> : null}
      <rect
        className="touch"
        x={frame.left}
        y={frame.top}
        width={frame.width}
        height={frame.height}
        fill="transparent"
        role="button"
        tabIndex={0}
        aria-label={t('cutaway.touch')}
        onClick={touch}
        onKeyDown={move}
        onBlur={() => setCross(null)}
      />
    </>
  );
}
