// Which wedges carry their words on the drawing and which only a letter, explained below it.
import type { Side } from '@tiltwright/shared/engine/beams/fan.ts';
import { type FanWedge, fanDirection } from './fan-wedges.ts';
import type { Point2 } from './views.ts';

export interface WedgeLabel {
  side: Side;
  wedge: FanWedge;
  /** A, B, C … for what is hidden or thinned and has no room for its words. */
  letter: string | null;
  /** Middle of the text, pixels; null where the wedge has no room even for a letter. */
  atPx: Point2 | null;
  lines: readonly string[];
}

/** Width of a character at 13 px, and of a line, on average for this typeface. */
const characterPx = 7;
const linePx = 16;
/** Free paper kept at the edges, the height of the scale bar, and how near the sensor no text may stand, pixels. */
const edgePx = 8;
const scaleBarPx = 18;
const nearestPx = 44;

/** A rectangle on the paper, pixels. */
export interface PaperBox {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

interface Paper {
  widthPx: number;
  heightPx: number;
  /** Where the motors are drawn; no text goes there. */
  taken: readonly PaperBox[];
}

/** "4° – 31°" */
export function degreeRange(fromDeg: number, toDeg: number): string {
  return `${Math.round(fromDeg)}° – ${Math.round(toDeg)}°`;
}

interface Fan {
  side: Side;
  wedges: readonly FanWedge[];
}

/**
 * Places a label in every wedge that has room. The origin is the face centre in pixels; the clear wedges of a side are named once, on the widest.
 * Where the words do not fit a letter stands in; letters run through both fans from the top down, port first.
 */
export function wedgeLabels(fans: readonly Fan[], originPx: Point2, radiusPx: number, paper: Paper): WedgeLabel[] {
  let letters = 0;
  return fans.flatMap(({ side, wedges }) => {
    const clear = wedges.filter((wedge) => wedge.kind === 'clear').sort((a, b) => b.toDeg - b.fromDeg - (a.toDeg - a.fromDeg))[0];
    return wedges.flatMap((wedge): WedgeLabel[] => {
      if (wedge.kind === 'clear' && wedge !== clear) return [];
      const words =
        wedge.by === null
          ? ['clear', degreeRange(wedge.fromDeg, wedge.toDeg)]
          : [`${wedge.kind} by`, ...`the ${wedge.by}`.split(/ (?=of the )/)];
      const roomForWords = placeOf(words, side, wedge, originPx, radiusPx, paper);
      if (roomForWords || wedge.kind === 'clear') return [{ side, wedge, letter: null, atPx: roomForWords, lines: words }];
      const letter = String.fromCharCode(65 + letters++);
      return [{ side, wedge, letter, atPx: placeOf([letter], side, wedge, originPx, radiusPx, paper), lines: [letter] }];
    });
  });
}

/** The rectangle around points on the paper. */
export function boxAround(points: readonly Point2[]): PaperBox {
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  return { left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), bottom: Math.max(...ys) };
}

/** Middle of the text in the wedge, as far out as the paper and the arc allow, where the motor is not; null where it does not fit. */
function placeOf(lines: readonly string[], side: Side, wedge: FanWedge, [ox, oy]: Point2, radiusPx: number, paper: Paper): Point2 | null {
  const [, across, down] = fanDirection(side, (wedge.fromDeg + wedge.toDeg) / 2);
  const halfWidePx = (Math.max(...lines.map((line) => line.length)) * characterPx) / 2;
  const halfHighPx = (lines.length * linePx) / 2;
  const edgeX = across < 0 ? ox : paper.widthPx - ox;
  const outPx = Math.min(
    radiusPx - halfWidePx * Math.abs(across) - halfHighPx * down - 4,
    (edgeX - halfWidePx - edgePx) / Math.max(Math.abs(across), 1e-9),
    (paper.heightPx - oy - halfHighPx - edgePx - scaleBarPx) / Math.max(down, 1e-9),
  );
  const openPx = ((wedge.toDeg - wedge.fromDeg) * Math.PI * outPx) / 180;
  const needPx = 2 * halfHighPx * Math.abs(across) + 2 * halfWidePx * down;
  if (outPx < nearestPx || openPx < needPx) return null;
  const [x, y] = [ox + across * outPx, oy + down * outPx];
  const covers = (box: PaperBox) =>
    x + halfWidePx > box.left && x - halfWidePx < box.right && y + halfHighPx > box.top && y - halfHighPx < box.bottom;
  return paper.taken.some(covers) ? null : [x, y];
}
