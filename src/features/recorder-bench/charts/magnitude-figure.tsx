import { ReferenceArea, ReferenceLine } from 'recharts';
import type { Responses } from '../../../../shared/recorder-bench/responses';
import { LineFigure } from './line-figure';
import type { LineSeries } from './line-series';

export type MagnitudeScale = 'percent' | 'decibel';

interface MagnitudeFigureProps {
  names: readonly string[];
  responses: readonly (Responses | null)[];
  scale: MagnitudeScale;
}

const tenHz = 10;
const floorDb = -60;

/** Limits of the diagnostic sine series (IEC 60601-2-25:2011, table 201.107): from, to in Hz, least and most gain. */
const mask = [
  { fromHz: 0.67, toHz: 40, least: 0.9 },
  { fromHz: 40, toHz: 150, least: 0.7 },
] as const;
const mostGain = 1.1;
const maskToHz = 500;
const ticksHz = [0.01, 0.05, 0.5, 1, 5, 10, 40, 150, 500];

function onScale(gain: number, scale: MagnitudeScale): number {
  return scale === 'percent' ? 100 * gain : Math.max(floorDb, 20 * Math.log10(Math.max(1e-6, gain)));
}

function series(
  names: readonly string[],
  responses: MagnitudeFigureProps['responses'],
  scale: MagnitudeScale,
) {
  return names.map((name, i): LineSeries => {
    const points = responses[i]?.magnitude ?? [];
    const nearest = points.reduce<(typeof points)[number] | null>(
      (best, one) =>
        !best || Math.abs(Math.log(one.frequencyHz / tenHz)) < Math.abs(Math.log(best.frequencyHz / tenHz))
          ? one
          : best,
      null,
    );
    return {
      name,
      points: points.map(({ frequencyHz, gain }) => ({
        x: frequencyHz,
        y: onScale(gain / (nearest?.gain ?? 1), scale),
      })),
    };
  });
}

/** The measured response of every setting with the standard's limits as a mask. */
export function MagnitudeFigure({ names, responses, scale }: MagnitudeFigureProps) {
  const percent = scale === 'percent';
  const bottom = percent ? 0 : floorDb;
  const top = percent ? 125 : 6;
  const area = { fill: '#f3ead8', fillOpacity: 0.75, stroke: '#867b68', strokeOpacity: 0.7 } as const;
  return (
    <LineFigure
      description="Magnitude response of each setting, measured with sines from 0.01 to 500 Hz, with the limits of the diagnostic sine series"
      series={series(names, responses, scale)}
      x={{ label: 'Frequency', unit: 'Hz', scale: 'log', domain: [0.01, 500], ticks: ticksHz }}
      y={{
        label: 'Gain against 10 Hz',
        unit: percent ? '%' : 'dB',
        domain: [bottom, top],
        ticks: percent ? [0, 25, 50, 70, 90, 110] : [-60, -40, -20, -3, 0],
      }}
    >
      {mask.map(({ fromHz, toHz, least }) => (
        <ReferenceArea key={fromHz} x1={fromHz} x2={toHz} y1={bottom} y2={onScale(least, scale)} {...area} />
      ))}
      <ReferenceArea x1={mask[0].fromHz} x2={maskToHz} y1={onScale(mostGain, scale)} y2={top} {...area} />
      <ReferenceLine y={onScale(Math.SQRT1_2, scale)} stroke="#867b68" strokeDasharray="2 3" />
    </LineFigure>
  );
}
