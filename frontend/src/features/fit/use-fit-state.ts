import { useCallback, useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router';
import type { FitState } from './fit-state.ts';
import { type FitAddress, type LinkStamp, readFitAddress, writeFitAddress } from './fit-url.ts';

/** Browsers refuse more than about a hundred address changes in half a minute, so a moving slider writes a few times a second. */
const writeEveryMs = 300;

export interface FitPage extends FitAddress {
  change: (changes: Partial<FitState>) => void;
  /** Stamps the address with what the shown answer was computed with. */
  stampWith: (stamp: LinkStamp) => void;
  forgetRefused: () => void;
}

/**
 * The check on the page. The state here is ahead of the address by a moment; the address is written behind it and read again
 * when it changes by other means: back, forward, another link.
 */
export function useFitState(): FitPage {
  const [search, setSearch] = useSearchParams();
  const [page, setPage] = useState<FitAddress>(() => readFitAddress(search));
  const written = useRef(search.toString());
  const waiting = useRef<{ timer: ReturnType<typeof setTimeout>; text: string } | null>(null);

  const flush = useCallback(() => {
    if (!waiting.current) return;
    clearTimeout(waiting.current.timer);
    written.current = waiting.current.text;
    waiting.current = null;
    setSearch(new URLSearchParams(written.current), { replace: true, preventScrollReset: true });
  }, [setSearch]);
  const latestFlush = useRef(flush);
  latestFlush.current = flush;

  const write = useCallback((state: FitState, stamp: LinkStamp) => {
    const text = writeFitAddress(state, stamp).toString();
    if (waiting.current) {
      waiting.current.text = text;
      return;
    }
    if (text === written.current) return;
    waiting.current = { text, timer: setTimeout(() => latestFlush.current(), writeEveryMs) };
  }, []);

  // The address changed by other means than by this hook.
  const current = search.toString();
  useEffect(() => {
    if (current === written.current) return;
    if (waiting.current) clearTimeout(waiting.current.timer);
    waiting.current = null;
    written.current = current;
    setPage(readFitAddress(new URLSearchParams(current)));
  }, [current]);

  // A reload or a step to another page in the next moment must not lose the last change.
  useEffect(() => {
    const save = () => {
      if (!waiting.current) return;
      const { text } = waiting.current;
      window.history.replaceState(window.history.state, '', text === '' ? window.location.pathname : `?${text}`);
    };
    window.addEventListener('pagehide', save);
    return () => {
      window.removeEventListener('pagehide', save);
      if (waiting.current) clearTimeout(waiting.current.timer);
    };
  }, []);

  const latest = useRef(page);
  const put = useCallback(
    (next: FitAddress) => {
      latest.current = next;
      setPage(next);
      write(next.state, next.stamp);
    },
    [write],
  );
  useEffect(() => {
    latest.current = page;
  }, [page]);

  const change = useCallback(
    (changes: Partial<FitState>) => {
      const { state, refused } = latest.current;
      const changed = Object.keys(changes);
      put({
        state: { ...state, ...changes },
        refused: refused.filter(({ name }) => !changed.includes(name)),
        // What a link was made with says nothing about a check that has been changed since.
        stamp: { edition: null, engineVersion: null },
      });
    },
    [put],
  );
  const stampWith = useCallback((stamp: LinkStamp) => put({ ...latest.current, stamp }), [put]);
  const forgetRefused = useCallback(() => put({ ...latest.current, refused: [] }), [put]);
  return { ...page, change, stampWith, forgetRefused };
}
