import { useLayoutEffect, useRef, useState, type RefObject } from 'react';

/**
 * The width in px a drawing has on the page, so that it is drawn at that size and its words keep theirs. `usual` until it is
 * known, and where nothing is laid out.
 */
export function useDrawnWidth(usual: number): [RefObject<HTMLDivElement | null>, number] {
  const place = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(usual);
  useLayoutEffect(() => {
    const element = place.current;
    if (!element) return;
    const read = (): void => {
      if (element.clientWidth > 0) setWidth(element.clientWidth);
    };
    read();
    const observer = new ResizeObserver(read);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [place, width];
}
