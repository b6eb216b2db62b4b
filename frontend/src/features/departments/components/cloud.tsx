import { useLayoutEffect, useRef, useState, type ReactNode } from 'react';
import { cloudPath } from '../cloud-path';

/** A revision cloud drawn round what it holds: it changed against the version beside it. */
export function Cloud({ children }: { children: ReactNode }): ReactNode {
  const place = useRef<HTMLDivElement>(null);
  const [size, setSize] = useState({ width: 0, height: 0 });
  useLayoutEffect(() => {
    const element = place.current;
    if (element === null) return;
    const read = (): void => setSize({ width: element.offsetWidth, height: element.offsetHeight });
    read();
    const observer = new ResizeObserver(read);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return (
    <div className="cloud" ref={place}>
      <svg className="cloud-line" width={size.width} height={size.height} aria-hidden="true" focusable="false">
        <path d={cloudPath(size.width, size.height)} />
      </svg>
      {children}
    </div>
  );
}
