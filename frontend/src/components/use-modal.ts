import { useEffect, useRef, type RefObject } from 'react';

/**
 * Opens a dialog over the page for as long as it is drawn, and gives the focus back to what had it. The browser gives it back by itself only
 * to a dialog still on the page when it closes, and React has taken it off by then.
 */
export function useModal(isOpen = true): RefObject<HTMLDialogElement | null> {
  const dialog = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const shown = dialog.current;
    if (!isOpen || shown === null) return;
    const asker = document.activeElement;
    shown.showModal();
    return () => {
      shown.close();
      const isLost = document.activeElement === null || document.activeElement === document.body;
      if (isLost && asker instanceof HTMLElement && asker.isConnected) asker.focus();
    };
  }, [isOpen]);
  return dialog;
}
