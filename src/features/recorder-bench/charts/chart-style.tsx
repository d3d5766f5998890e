import { seriesLooks } from '../state/series';

export const axisTick = { fill: '#46515e', fontSize: 12, fontFamily: 'IBM Plex Mono' } as const;
export const axisLine = { stroke: '#867b68' } as const;
export const gridStroke = '#e3dbcc';
export const chartHeightPx = 272;
export const chartMargin = { top: 12, right: 14, bottom: 0, left: 4 } as const;

/** Which line is which setting: colour and dash, in words. */
export function SeriesLegend({ names }: { names: readonly string[] }) {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-dense">
      {names.map((name, i) => (
        <li key={`${i}-${name}`} className="flex items-center gap-2">
          <svg width="28" height="8" aria-hidden="true">
            <line
              x1="0"
              x2="28"
              y1="4"
              y2="4"
              stroke={seriesLooks[i].colour}
              strokeWidth="2"
              strokeDasharray={seriesLooks[i].dash}
            />
          </svg>
          {name}
        </li>
      ))}
    </ul>
  );
}
