import { type RefObject, useLayoutEffect, useRef, useState } from 'react';

/**
 * Width in pixels of the element the ref is put on, followed as it changes.
 * Measured before the first paint, so that nothing jumps; `fallbackPx` stands where nothing can be measured.
 */
export function useMeasuredWidth<T extends HTMLElement>(fallbackPx: number): [RefObject<T | null>, number] {
  const ref = useRef<T | null>(null);
  const [widthPx, setWidthPx] = useState(fallbackPx);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const measure = () => {
      const measured = Math.floor(element.getBoundingClientRect().width);
      if (measured > 0) setWidthPx(measured);
    };
    measure();
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, widthPx];
}
