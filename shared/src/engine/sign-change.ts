/**
 * Where a function changes sign between two places where its signs differ, to about 1e-13 of the place.
 * Chandrupatla 1997, Advances in Engineering Software 28(3), 145–149: inverse quadratic steps where they are safe, halving elsewhere.
 */
export function signChange(f: (x: number) => number, from: number, atFrom: number, to: number, atTo: number): number {
  // a is the newest place, b the one with the other sign, c the one before; the first step is where a straight line would cross.
  let a = from;
  let fa = atFrom;
  let b = to;
  let fb = atTo;
  let c = b;
  let fc = fb;
  let t = fa / (fa - fb);
  if (!(t > 0 && t < 1)) t = 0.5;
  for (let i = 0; i < 100; i++) {
    const x = a + t * (b - a);
    const fx = f(x);
    if (fx > 0 === fa > 0) {
      c = a;
      fc = fa;
    } else {
      c = b;
      b = a;
      fc = fb;
      fb = fa;
    }
    a = x;
    fa = fx;
    const least = Math.abs(fa) < Math.abs(fb) ? a : b;
    const limit = (2e-14 * Math.abs(least) + 1e-300) / Math.abs(b - a);
    if (fx === 0 || limit > 0.5) return least;
    const xi = (a - b) / (c - b);
    const phi = (fa - fb) / (fc - fb);
    t = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi ? quadraticStep(a, fa, b, fb, c, fc) : 0.5;
    t = Math.min(1 - limit, Math.max(limit, t));
  }
  return a;
}

function quadraticStep(a: number, fa: number, b: number, fb: number, c: number, fc: number): number {
  return (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb));
}
