import { useEffect, useState } from 'react';

/** The value once it has stood still for so long; the server is asked once a word is typed, not for each letter. */
export function useSettled<Value>(value: Value, afterMs: number): Value {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = window.setTimeout(() => {
      setSettled(value);
    }, afterMs);
    return () => {
      window.clearTimeout(timer);
    };
  }, [value, afterMs]);
  return settled;
}
