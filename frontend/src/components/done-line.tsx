import { useEffect, useState, useSyncExternalStore, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Mark, type MarkName } from './mark';

/** How long a done line stays, in milliseconds; while pointed at or focused it stays longer. */
export const doneLineMs = 6000;

export interface DoneLineWords {
  mark: MarkName;
  title: string;
  text?: string;
  link?: { to: string; word: string };
}

interface Kept extends DoneLineWords {
  key: number;
}

let shown: Kept | null = null;
let nextKey = 1;
const listeners = new Set<() => void>();

function set(line: Kept | null): void {
  shown = line;
  listeners.forEach((listener) => listener());
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Says in one line that an act was done. What matters later is a notice as well. */
export function sayDone(line: DoneLineWords): void {
  set({ ...line, key: nextKey++ });
}

/** The place of the done line, at the lower left: mount once. Its live region is polite and always there. */
export function DoneLine(): ReactNode {
  const line = useSyncExternalStore(subscribe, () => shown);
  const [isHeld, setIsHeld] = useState(false);
  useEffect(() => {
    if (!line || isHeld) return;
    const timer = window.setTimeout(() => set(null), doneLineMs);
    return () => window.clearTimeout(timer);
  }, [line, isHeld]);
  return (
    <div
      className="done-place"
      role="status"
      aria-live="polite"
      onPointerEnter={() => setIsHeld(true)}
      onPointerLeave={() => setIsHeld(false)}
      onFocus={() => setIsHeld(true)}
      onBlur={() => setIsHeld(false)}
    >
      {line ? (
        <div className="done" key={line.key}>
          <Mark name={line.mark} size={24} />
          <div className="grow">
            <span className="b">{line.title}</span>
            {line.text ? <div className="s mid">{line.text}</div> : null}
          </div>
          {line.link ? (
            <Link className="s" to={line.link.to} onClick={() => set(null)}>
              {line.link.word}
            </Link>
          ) : null}
        </div>
      ) : null}
    </div>
  );
}
