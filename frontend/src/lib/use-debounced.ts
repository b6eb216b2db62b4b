import { useEffect, useState } from 'react';

/** A value that follows once it has rested for `restMs`: one question to the server per pause in typing. */
export function useDebounced<T>(value: T, restMs = 250): T {
  const [rested, setRested] = useState(value);
  useEffect(() => {
    const timer = window.setTimeout(() => setRested(value), restMs);
    return () => window.clearTimeout(timer);
  }, [value, restMs]);
  return rested;
}
