import { useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router';
import { useSettled } from './use-settled.ts';

/**
 * Text of a field that is kept in the address as well. The field owns its text: the address follows once typing settles,
 * since it changes in a transition and would hand old text back to a fast typist. Going elsewhere and back sets the field again.
 */
export function useTextInAddress(name: string, settleMs: number): [text: string, setText: (text: string) => void] {
  const [search, setSearch] = useSearchParams();
  const inAddress = search.get(name) ?? '';
  const [text, setText] = useState(inAddress);
  const settled = useSettled(text.trim() === '' ? '' : text, settleMs);
  const latest = useRef(inAddress);
  /** Texts of our own that the address has not caught up with. */
  const underWay = useRef(new Set<string>());

  useEffect(() => {
    if (inAddress === latest.current) underWay.current.clear();
    else if (!underWay.current.has(inAddress)) {
      latest.current = inAddress;
      setText(inAddress);
    }
  }, [inAddress]);

  useEffect(() => {
    if (settled === latest.current) return;
    latest.current = settled;
    underWay.current.add(settled);
    setSearch(
      (before) => {
        const after = new URLSearchParams(before);
        if (settled === '') after.delete(name);
        else after.set(name, settled);
        return after;
      },
      { replace: true, preventScrollReset: true },
    );
  }, [settled, name, setSearch]);

  return [text, setText];
}
