import { useMemo, type ReactNode } from 'react';
import { qrPath } from '../qr-path';

/** A QR code, drawn: it needs no image and no inline style, so that the page's policy holds. */
export function QrPicture({ text, name, sizePx }: { text: string; name: string; sizePx: number }): ReactNode {
  const { size, path } = useMemo(() => qrPath(text), [text]);
  return (
    <svg
      className="qr"
      width={sizePx}
      height={sizePx}
      viewBox={`0 0 ${size} ${size}`}
      role="img"
      aria-label={name}
      shapeRendering="crispEdges"
    >
      <rect width={size} height={size} fill="white" />
      <path d={path} fill="black" />
    </svg>
  );
}
