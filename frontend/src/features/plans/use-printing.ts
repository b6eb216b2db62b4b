import { useCallback, useEffect, useState } from 'react';
import { flushSync } from 'react-dom';

/** Whether the page is being printed, by its own act or the browser's: what is for paper alone is drawn only then. */
export function usePrinting(): { isPrinting: boolean; print: () => void } {
  const [isPrinting, setPrinting] = useState(false);
  useEffect(() => {
    // the browser takes the page as it stands when this returns
    const before = (): void => flushSync(() => setPrinting(true));
    const after = (): void => setPrinting(false);
    window.addEventListener('beforeprint', before);
    window.addEventListener('afterprint', after);
    return () => {
      window.removeEventListener('beforeprint', before);
      window.removeEventListener('afterprint', after);
    };
  }, []);
  const print = useCallback(() => {
    flushSync(() => setPrinting(true));
    window.print();
  }, []);
  return { isPrinting, print };
}
