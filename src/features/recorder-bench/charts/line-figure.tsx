import type { ReactNode } from 'react';
import { CartesianGrid, Line, LineChart, ResponsiveContainer, Tooltip, XAxis, YAxis } from 'recharts';
import { seriesLooks } from '../state/series';
import { axisLine, axisTick, chartHeightPx, chartMargin, gridStroke, SeriesLegend } from './chart-style';
import { chartRows, seriesKey, type LineSeries } from './line-series';

interface Axis {
  label: string;
  unit: string;
  scale?: 'log' | 'linear';
  domain: [number, number];
  ticks: readonly number[];
  format?(value: number): string;
}

interface LineFigureProps {
  /** What the figure shows, for those who cannot see it. */
  description: string;
  series: readonly LineSeries[];
  x: Axis;
  y: Axis;
  /** Areas and lines behind the series. */
  children?: ReactNode;
}

const plain = (value: number): string => String(Number(value.toPrecision(4)));

/** Lines over one axis, with their legend; numbers under the pointer. */
export function LineFigure({ description, series, x, y, children }: LineFigureProps) {
  return (
    <figure className="m-0">
      <SeriesLegend names={series.map(({ name }) => name)} />
      <p className="mt-2 flex justify-between text-caption text-ink-2">
        <span>{`${y.label}, ${y.unit}`}</span>
        <span>{`${x.label}, ${x.unit}`}</span>
      </p>
      <div role="img" aria-label={description} style={{ height: chartHeightPx }}>
        <ResponsiveContainer
          width="100%"
          height="100%"
          initialDimension={{ width: 520, height: chartHeightPx }}
        >
          <LineChart data={chartRows(series)} margin={chartMargin} accessibilityLayer={false}>
            {children}
            <CartesianGrid stroke={gridStroke} vertical={false} />
            <XAxis
              dataKey="x"
              type="number"
              scale={x.scale ?? 'linear'}
              domain={x.domain}
              ticks={[...x.ticks]}
              tickFormatter={x.format ?? plain}
              tick={axisTick}
              axisLine={axisLine}
              tickLine={axisLine}
              allowDataOverflow
              interval={0}
            />
            <YAxis
              type="number"
              scale={y.scale ?? 'linear'}
              domain={y.domain}
              ticks={[...y.ticks]}
              tickFormatter={y.format ?? plain}
              tick={axisTick}
              axisLine={axisLine}
              tickLine={axisLine}
              width={46}
              allowDataOverflow
            />
            <Tooltip
              isAnimationActive={false}
              labelFormatter={(value) => `${plain(Number(value))} ${x.unit}`}
              formatter={(value) => `${plain(Number(value))} ${y.unit}`}
              contentStyle={{ background: '#fffdf9', border: '1px solid #cbc0ac', fontSize: 12 }}
            />
            {series.map(({ name }, i) => (
              <Line
                key={`${i}-${name}`}
                type="linear"
                dataKey={seriesKey(i)}
                name={name}
                stroke={seriesLooks[i].colour}
                strokeDasharray={seriesLooks[i].dash}
                strokeWidth={2}
                dot={false}
                connectNulls
                isAnimationActive={false}
              />
            ))}
          </LineChart>
        </ResponsiveContainer>
      </div>
    </figure>
  );
}
