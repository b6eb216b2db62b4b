import { useLocation } from 'react-router-dom';
import { findSheet, sheetsFor, type Sheet } from '../sheets';
import { useWorker } from '../use-worker';

/** The sheet of the page shown, for "you are here"; null on pages of no sheet. */
export function useCurrentSheet(): Sheet | null {
  const worker = useWorker();
  const { pathname } = useLocation();
  return findSheet(sheetsFor(worker), pathname);
}
