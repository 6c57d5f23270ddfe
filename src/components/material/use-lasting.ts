import { useEffect, useState } from 'react';

/** True once a condition has lasted for so long: what is over sooner is never mentioned. */
export function useLasting(isTrue: boolean, afterMs: number): boolean {
  const [hasLasted, setHasLasted] = useState(false);
  useEffect(() => {
    if (!isTrue) return undefined;
    const timer = window.setTimeout(() => {
      setHasLasted(true);
    }, afterMs);
    return () => {
      window.clearTimeout(timer);
      setHasLasted(false);
    };
  }, [isTrue, afterMs]);
  return isTrue && hasLasted;
}
