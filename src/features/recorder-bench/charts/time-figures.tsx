import type { Responses, TimeResponse } from '../../../../shared/recorder-bench/responses';
import { LineFigure } from './line-figure';
import type { LineSeries } from './line-series';

interface ResponseFigureProps {
  names: readonly string[];
  responses: readonly (Responses | null)[];
}

/** At most this many points a line: more than a screen has columns. */
const mostPoints = 700;

function overTime(response: TimeResponse | undefined, timeFactor: number, valueFactor: number) {
  if (!response) return [];
  const { timesS, valuesMv } = response;
  const every = Math.ceil(timesS.length / mostPoints);
  return Array.from({ length: Math.floor(timesS.length / every) }, (_, k) => ({
    x: timeFactor * timesS[k * every],
    y: valueFactor * valuesMv[k * every],
  }));
}

function seriesOf(
  { names, responses }: ResponseFigureProps,
  points: (responses: Responses | null) => LineSeries['points'],
): LineSeries[] {
  return names.map((name, i) => ({ name, points: points(responses[i]) }));
}

/** Round limits that hold every value, and five ticks or so between them. */
function axisOver(series: readonly LineSeries[]): { domain: [number, number]; ticks: number[] } {
  const values = series.flatMap(({ points }) => points.map(({ y }) => y ?? 0));
  const high = Math.max(0.1, ...values);
  const low = Math.min(0, ...values);
  const rough = (high - low) / 5;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((one) => one * power).find((one) => one >= rough) ?? rough;
  const from = Math.floor(low / step);
  const to = Math.ceil(high / step);
  const ticks = Array.from({ length: to - from + 1 }, (_, i) => Number(((from + i) * step).toPrecision(6)));
  return { domain: [from * step, to * step], ticks };
}

/** What a stimulus-like impulse becomes. */
export function ImpulseFigure(props: ResponseFigureProps) {
  const series = seriesOf(props, (one) => overTime(one?.impulse, 1000, 1000));
  return (
    <LineFigure
      description="Answer of each setting to an impulse of 1 mV and 0.25 ms"
      series={series}
      x={{ label: 'Time', unit: 'ms', domain: [-20, 80], ticks: [-20, 0, 20, 40, 60, 80] }}
      y={{ label: 'After 1 mV for 0.25 ms', unit: 'µV', ...axisOver(series) }}
    />
  );
}

/** How a level that stays is forgotten. */
export function StepFigure(props: ResponseFigureProps) {
  return (
    <LineFigure
      description="Answer of each setting to a step of 1 mV"
      series={seriesOf(props, (one) => overTime(one?.step, 1, 1))}
      x={{ label: 'Time', unit: 's', domain: [-0.2, 4], ticks: [0, 1, 2, 3, 4] }}
      y={{ label: 'After a step of 1 mV', unit: 'mV', domain: [-0.4, 1.2], ticks: [-0.4, 0, 0.4, 0.8, 1.2] }}
    />
  );
}

const mostDelayMs = 100;

/** Group delay that is left. */
export function DelayFigure(props: ResponseFigureProps) {
  const series = seriesOf(props, (one) =>
    (one?.magnitude ?? [])
      .filter(({ gain, groupDelayMs }) => groupDelayMs !== null && gain > 0.01)
      .map(({ frequencyHz, groupDelayMs }) => ({
        x: frequencyHz,
        y: Math.max(-20, Math.min(mostDelayMs, groupDelayMs ?? 0)),
      })),
  );
  return (
    <LineFigure
      description="Group delay of each setting over frequency, after the delay of the low-pass was removed; cut at 100 ms"
      series={series}
      x={{
        label: 'Frequency',
        unit: 'Hz',
        scale: 'log',
        domain: [0.1, 250],
        ticks: [0.1, 0.5, 1, 5, 10, 40, 150],
      }}
      y={{
        label: 'Group delay left',
        unit: 'ms',
        domain: [-20, mostDelayMs],
        ticks: [-20, 0, 20, 40, 60, 80, 100],
      }}
    />
  );
}
