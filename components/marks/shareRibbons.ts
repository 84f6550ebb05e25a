export interface SharePart {
  key: string;
  label: string;
  /** Share of the brain's mass and neurons, 0 to 1; each sums to at most 1. */
  massShare: number;
  neuronShare: number;
}

export interface Ribbon extends SharePart {
  top: { from: number; to: number };
  bottom: { from: number; to: number };
  /** Closed outline between both bars. */
  path: string;
}

/** Where each part lies on the bar of mass (above) and of neurons (below), in px, and the ribbon between; gaps of `gap` px part them. */
export function shareRibbons(parts: readonly SharePart[], { width, top, bottom, gap }: { width: number; top: number; bottom: number; gap: number }): Ribbon[] {
  const usable = width - gap * Math.max(0, parts.length - 1);
  const massTotal = parts.reduce((sum, part) => sum + part.massShare, 0) || 1;
  const neuronTotal = parts.reduce((sum, part) => sum + part.neuronShare, 0) || 1;
  let upper = 0;
  let lower = 0;
  return parts.map((part) => {
    const t = { from: upper, to: upper + (part.massShare / massTotal) * usable };
    const b = { from: lower, to: lower + (part.neuronShare / neuronTotal) * usable };
    upper = t.to + gap;
    lower = b.to + gap;
    const middle = (top + bottom) / 2;
    const path = `M${t.from} ${top}L${t.to} ${top}C${t.to} ${middle} ${b.to} ${middle} ${b.to} ${bottom}L${b.from} ${bottom}C${b.from} ${middle} ${t.from} ${middle} ${t.from} ${top}Z`;
    return { ...part, top: t, bottom: b, path };
  });
}

/** Label that fits over a span of px: name and share, share alone, or nothing. */
export function shareLabel(label: string, share: number, widthPx: number): { name: string; share: string } | null {
  const percent = `${Math.round(share * 100)} %`;
  if (widthPx >= (label.length + percent.length + 1) * 7.4) return { name: `${label} `, share: percent };
  return widthPx >= 30 ? { name: '', share: percent } : null;
}
