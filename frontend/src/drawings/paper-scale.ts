// From metres to pixels at a whole-number scale, as on a drawing board.
import type { Point2 } from './views.ts';

/** CSS reference pixels in a metre: 96 to the inch of 25.4 mm (CSS Values and Units Level 4, 6.2). */
const pxPerMetre = 96 / 0.0254;

/** What has to be seen, metres on paper. */
export interface PaperBounds {
  leftM: number;
  rightM: number;
  topM: number;
  bottomM: number;
}

/** Room kept free around it for dimension lines and captions, pixels. */
export interface PaperMargins {
  leftPx: number;
  rightPx: number;
  topPx: number;
  bottomPx: number;
}

export interface PaperScale {
  /** The drawing is 1 : ratio at the nominal pixel size. */
  ratio: number;
  pxPerM: number;
  widthPx: number;
  heightPx: number;
  /** Paper metres to pixels from the drawing's top left. */
  at: (point: Point2) => Point2;
  /** Pixels back to paper metres. */
  back: (point: Point2) => Point2;
}

/** The largest whole-number scale at which the bounds fit the width, and the height where one is given; bounds are centred across. */
export function paperScale(
  bounds: PaperBounds,
  margins: PaperMargins,
  widthPx: number,
  maxHeightPx = Number.POSITIVE_INFINITY,
): PaperScale {
  const wideM = Math.max(bounds.rightM - bounds.leftM, 0.01);
  const highM = Math.max(bounds.bottomM - bounds.topM, 0.01);
  const freePx = Math.max(widthPx - margins.leftPx - margins.rightPx, 40);
  const freeHighPx = Math.max(maxHeightPx - margins.topPx - margins.bottomPx, 40);
  const ratio = Math.max(1, Math.ceil(pxPerMetre / Math.min(freePx / wideM, freeHighPx / highM)));
  const pxPerM = pxPerMetre / ratio;
  const leftPx = margins.leftPx + (freePx - wideM * pxPerM) / 2;
  return {
    ratio,
    pxPerM,
    widthPx,
    heightPx: Math.round(highM * pxPerM + margins.topPx + margins.bottomPx),
    at: ([u, v]) => [leftPx + (u - bounds.leftM) * pxPerM, margins.topPx + (v - bounds.topM) * pxPerM],
    back: ([x, y]) => [(x - leftPx) / pxPerM + bounds.leftM, (y - margins.topPx) / pxPerM + bounds.topM],
  };
}

/** The longest of 50, 100, 200, 500, 1000 or 2000 mm whose bar is no longer than `longestPx`. */
export function scaleBarMm(pxPerM: number, longestPx: number): number {
  const fitting = [2000, 1000, 500, 200, 100, 50].find((mm) => (mm / 1000) * pxPerM <= longestPx);
  return fitting ?? 50;
}

/** Points as an SVG `points` attribute, to a tenth of a pixel. */
export function svgPoints(points: readonly Point2[]): string {
  return points.map(([x, y]) => `${round(x)},${round(y)}`).join(' ');
}

/** To a tenth of a pixel: finer is not seen and makes the markup long. */
export function round(px: number): number {
  return Math.round(px * 10) / 10;
}
