// Plane geometry behind the first page's drawing: what a round part hides from one point. Angles below level, in degrees.

export interface Point {
  x: number;
  y: number;
}

/**
 * Directions from `eye` that touch a circle, as depressions towards −x (0 level, 90 straight down; y grows downwards):
 * the middle ± asin(r / d). The eye must lie outside the circle.
 */
export function hiddenByCircle(eye: Point, centre: Point, radius: number): { fromDeg: number; toDeg: number } {
  const dx = eye.x - centre.x;
  const dy = centre.y - eye.y;
  const middle = Math.atan2(dy, dx);
  const half = Math.asin(radius / Math.hypot(dx, dy));
  return { fromDeg: degrees(middle - half), toDeg: degrees(middle + half) };
}

/** Depression of one point as seen from `eye`, towards −x. */
export function depressionDeg(eye: Point, point: Point): number {
  return degrees(Math.atan2(point.y - eye.y, eye.x - point.x));
}

/** SVG path of a sector around `eye` from one depression to another; `side` −1 opens to the left, 1 to the right. */
export function sectorPath(eye: Point, radius: number, fromDeg: number, toDeg: number, side: -1 | 1): string {
  const at = (deg: number) => {
    const a = (deg * Math.PI) / 180;
    return `${(eye.x + side * radius * Math.cos(a)).toFixed(1)} ${(eye.y + radius * Math.sin(a)).toFixed(1)}`;
  };
  return `M${eye.x} ${eye.y}L${at(fromDeg)}A${radius} ${radius} 0 0 ${side === 1 ? 1 : 0} ${at(toDeg)}Z`;
}

function degrees(rad: number): number {
  return (rad * 180) / Math.PI;
}
