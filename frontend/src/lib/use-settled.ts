import { useEffect, useState } from 'react';

/** The value as it was when it last stood still for `ms`; so that a request goes out per word and not per key. */
export function useSettled<T>(value: T, ms: number): T {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), ms);
    return () => clearTimeout(timer);
  }, [value, ms]);
  return settled;
}
