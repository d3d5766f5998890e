/** One line of a chart: points in order of x; gaps are null. */
export interface LineSeries {
  name: string;
  points: readonly { x: number; y: number | null }[];
}

/** Rows as recharts wants them: every x once, with the value of each series there. */
export type ChartRow = { x: number } & Record<string, number | null>;

/** The key of a series in a row. */
export const seriesKey = (index: number): string => `y${index}`;

/** Merges series into rows; where a series has no point, recharts connects its neighbours. */
export function chartRows(series: readonly LineSeries[]): ChartRow[] {
  const rows = new Map<number, ChartRow>();
  series.forEach(({ points }, i) => {
    for (const { x, y } of points) {
      const row = rows.get(x) ?? ({ x } as ChartRow);
      row[seriesKey(i)] = y;
      rows.set(x, row);
    }
  });
  return [...rows.values()].sort((a, b) => a.x - b.x);
}
