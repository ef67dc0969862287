import { type PointerEvent, useRef } from 'react';
import type { PaperScale } from './paper-scale.ts';
import type { Point2 } from './views.ts';

/** Pointer handlers for a handle on the drawing; the callback gets the pointer's place on paper, metres. Buttons do the same beside it. */
export function useDrag(scale: PaperScale, onMove: ((point: Point2) => void) | undefined) {
  const held = useRef<number | null>(null);
  if (!onMove) return {};
  return {
    style: { touchAction: 'none' as const },
    onPointerDown: (event: PointerEvent<SVGElement>) => {
      held.current = event.pointerId;
      event.currentTarget.setPointerCapture(event.pointerId);
    },
    onPointerMove: (event: PointerEvent<SVGElement>) => {
      if (held.current !== event.pointerId) return;
      const svg = event.currentTarget.ownerSVGElement;
      if (!svg) return;
      const box = svg.getBoundingClientRect();
      const stretch = scale.widthPx / Math.max(box.width, 1);
      onMove(scale.back([(event.clientX - box.left) * stretch, (event.clientY - box.top) * stretch]));
    },
    onPointerUp: () => {
      held.current = null;
    },
    onPointerCancel: () => {
      held.current = null;
    },
  };
}
