/** A plot's place in px and what it shows as log10 ranges; one decade is equally long on both axes. */
export interface Frame {
  left: number;
  top: number;
  width: number;
  height: number;
  pxPerDecade: number;
  /** log10 of the ends. */
  x: readonly [number, number];
  y: readonly [number, number];
}

export interface Margins {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** log10 range of values with `padding` decades to either side; values must be above zero. */
export function logRange(values: readonly number[], padding: number): [number, number] {
  const logs = values.filter((value) => value > 0 && Number.isFinite(value)).map((value) => Math.log10(value));
  if (logs.length === 0) return [0, 1];
  return [Math.min(...logs) - padding, Math.max(...logs) + padding];
}

function widen([from, to]: readonly [number, number], decades: number): [number, number] {
  const add = Math.max(0, decades - (to - from)) / 2;
  return [from - add, to + add];
}

/**
 * Fits both ranges into a drawing so that a decade is as long on y as on x: the scale is the largest
 * at which both fit; the axis with room left shows more on both sides.
 */
export function equalDecadeFrame(ranges: { x: readonly [number, number]; y: readonly [number, number] }, size: { width: number; height: number }, margins: Margins): Frame {
  const width = size.width - margins.left - margins.right;
  const height = size.height - margins.top - margins.bottom;
  if (!(width > 0 && height > 0)) throw new RangeError('No room for a plot between its margins.');
  const pxPerDecade = Math.min(width / (ranges.x[1] - ranges.x[0]), height / (ranges.y[1] - ranges.y[0]));
  return { left: margins.left, top: margins.top, width, height, pxPerDecade, x: widen(ranges.x, width / pxPerDecade), y: widen(ranges.y, height / pxPerDecade) };
}

/** Height at which both ranges fill a given width exactly, kept between two shares of the width. */
export function naturalHeight(ranges: { x: readonly [number, number]; y: readonly [number, number] }, width: number, margins: Margins, bounds: { least: number; most: number }): number {
  const inner = width - margins.left - margins.right;
  const wanted = (inner * (ranges.y[1] - ranges.y[0])) / (ranges.x[1] - ranges.x[0]);
  return Math.round(Math.min(bounds.most * inner, Math.max(bounds.least * inner, wanted)) + margins.top + margins.bottom);
}

/** px from the left of the drawing for a value of x. */
export function xPx(frame: Frame, value: number): number {
  return frame.left + (Math.log10(value) - frame.x[0]) * frame.pxPerDecade;
}

/** px from the top of the drawing for a value of y. */
export function yPx(frame: Frame, value: number): number {
  return frame.top + frame.height - (Math.log10(value) - frame.y[0]) * frame.pxPerDecade;
}
