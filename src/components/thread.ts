/**
 * The gap after a knot, in pixels: `6 + 15·log2(1 + minutes / 5)`. It grows with the time of the step but by the
 * logarithm, so that twelve hours stay on the page. Our own measure.
 *
 * @param seconds how long the step takes, hands-on or waiting; not negative
 */
export function threadGap(seconds: number): number {
  return 6 + 15 * Math.log2(1 + seconds / 60 / 5);
}
