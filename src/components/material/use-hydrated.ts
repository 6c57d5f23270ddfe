import { useSyncExternalStore } from 'react';

const never = (): (() => void) => () => undefined;

/** False on the server and while the browser takes over its markup, true from then on. */
export function useHydrated(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
