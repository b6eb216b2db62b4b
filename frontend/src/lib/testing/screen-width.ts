/**
 * Gives the page a width, px: jsdom has no layout and answers no media query. Understands `max-width` and `min-width`; every other
 * question is answered no.
 */
export function setScreenWidth(widthPx: number): void {
  const matches = (query: string): boolean => {
    const bounds = [...query.matchAll(/\((max|min)-width:\s*(\d+)px\)/g)];
    return (
      bounds.length > 0 &&
      bounds.every(([, side, px]) => (side === 'max' ? widthPx <= Number(px) : widthPx >= Number(px)))
    );
  };
  const ask = (query: string): MediaQueryList => {
    const list = {
      matches: matches(query),
      media: query,
      onchange: null,
      addListener: () => undefined,
      removeListener: () => undefined,
    };
    return Object.assign(new EventTarget(), list);
  };
  Object.defineProperty(window, 'matchMedia', { value: ask, writable: true, configurable: true });
}
