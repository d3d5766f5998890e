/** Runs of consecutive beat numbers, such as 1–4, 7–8 and 11. */
export function beatRanges(beats: readonly number[]): { from: number; to: number }[] {
  const ranges: { from: number; to: number }[] = [];
  for (const beat of [...beats].sort((a, b) => a - b)) {
    const last = ranges.at(-1);
    if (last && beat === last.to + 1) last.to = beat;
    else ranges.push({ from: beat, to: beat });
  }
  return ranges;
}

export function rangeWords({ from, to }: { from: number; to: number }): string {
  return from === to ? String(from) : `${from}–${to}`;
}
