/** Width of a bin of a profile, mm. */
const binMm = 1;

/**
 * How far the ink of one row reaches above and below its 0 mV line, in bins of 1 mm along the paper. Rows are
 * spaced, and labels placed, by what is really drawn.
 */
export class RowProfile {
  private readonly up: Float64Array;
  private readonly down: Float64Array;

  /** A bare row as wide as the paper. */
  constructor(widthMm: number) {
    const bins = Math.ceil(widthMm / binMm) + 1;
    this.up = new Float64Array(bins);
    this.down = new Float64Array(bins);
  }

  private binsOf(fromMm: number, toMm: number): [number, number] {
    const last = this.up.length - 1;
    return [Math.max(0, Math.floor(fromMm / binMm)), Math.min(last, Math.floor(toMm / binMm))];
  }

  /** Adds ink that reaches `heightMm` above the line (below when negative) between two places. */
  add(fromMm: number, toMm: number, heightMm: number): void {
    const [first, last] = this.binsOf(fromMm, toMm);
    for (let bin = first; bin <= last; bin++) {
      if (heightMm > this.up[bin]) this.up[bin] = heightMm;
      if (-heightMm > this.down[bin]) this.down[bin] = -heightMm;
    }
  }

  /** Greatest reach above the line between two places, mm; 0 for bare paper. */
  reachUpMm(fromMm = 0, toMm = Infinity): number {
    const [first, last] = this.binsOf(fromMm, toMm);
    let most = 0;
    for (let bin = first; bin <= last; bin++) most = Math.max(most, this.up[bin]);
    return most;
  }

  /** Greatest reach below the line between two places, mm. */
  reachDownMm(fromMm = 0, toMm = Infinity): number {
    const [first, last] = this.binsOf(fromMm, toMm);
    let most = 0;
    for (let bin = first; bin <= last; bin++) most = Math.max(most, this.down[bin]);
    return most;
  }

  /** Least distance between this row's line and the next one's at which their inks, 1 mm aside, just touch. */
  distanceToNextMm(next: RowProfile): number {
    return this.down.reduce(
      (most, value, bin) => Math.max(most, value + next.reachUpMm((bin - 1) * binMm, (bin + 1) * binMm)),
      0,
    );
  }

  /** A copy in which no ink reaches further than `mostMm` either way. */
  clipped(mostMm: number): RowProfile {
    const copy = new RowProfile((this.up.length - 1) * binMm);
    this.up.forEach((value, bin) => (copy.up[bin] = Math.min(value, mostMm)));
    this.down.forEach((value, bin) => (copy.down[bin] = Math.min(value, mostMm)));
    return copy;
  }
}
