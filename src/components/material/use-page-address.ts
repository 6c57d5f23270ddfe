import { useCallback, useEffect, useRef } from 'react';

/** Between two rewrites of the address while a value is dragged or typed; browsers refuse many in a row. */
const rewriteAfterMs = 200;

export interface PageAddress {
  /** Writes a query; `control` names what is being typed in or dragged, null a choice made at once. */
  readonly write: (query: string, control: string | null) => void;
  /** The next change of any control is a new step back in the history. */
  readonly settle: () => void;
}

/**
 * Keeps the page's state in its address: every choice, and the first change of a control that is typed in or dragged,
 * is a step in the browser's history; further changes of the same control rewrite that step.
 */
export function usePageAddress(onReturn: (query: URLSearchParams) => void): PageAddress {
  const active = useRef<string | null>(null);
  const pending = useRef<{ timer: number; query: string } | null>(null);

  const flush = useCallback(() => {
    if (pending.current === null) return;
    window.clearTimeout(pending.current.timer);
    window.history.replaceState(null, '', addressWith(pending.current.query));
    pending.current = null;
  }, []);

  const write = useCallback(
    (query: string, control: string | null) => {
      if (control !== null && control === active.current) {
        if (pending.current !== null) window.clearTimeout(pending.current.timer);
        pending.current = { timer: window.setTimeout(flush, rewriteAfterMs), query };
        return;
      }
      flush();
      active.current = control;
      window.history.pushState(null, '', addressWith(query));
    },
    [flush],
  );

  const settle = useCallback(() => {
    flush();
    active.current = null;
  }, [flush]);

  useEffect(() => {
    const onPopState = (): void => {
      if (pending.current !== null) window.clearTimeout(pending.current.timer);
      pending.current = null;
      active.current = null;
      onReturn(new URLSearchParams(window.location.search));
    };
    window.addEventListener('popstate', onPopState);
    return () => {
      window.removeEventListener('popstate', onPopState);
    };
  }, [onReturn]);

  return { write, settle };
}

function addressWith(query: string): string {
  return query === '' ? window.location.pathname : `${window.location.pathname}?${query}`;
}
