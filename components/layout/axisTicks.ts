/** Minor ticks of a log axis with one place per decade, as distances in px from the first place along the axis. */
export function minorTickOffsets(places: number, step: number): number[] {
  const offsets: number[] = [];
  for (let decade = -1; decade < places; decade += 1) {
    for (let digit = 2; digit <= 9; digit += 1) offsets.push((decade + Math.log10(digit)) * step);
  }
  return offsets;
}
