import type { Spectrum } from '../../../../shared/recorder-bench/spectrum';
import { LineFigure } from './line-figure';

/** Least density that is drawn, µV/√Hz: far below a quantiser's step. */
const floor = 0.01;

/** Amplitude density of what stands on the bench, through every setting. */
export function SpectrumFigure({
  names,
  spectra,
}: {
  names: readonly string[];
  spectra: readonly Spectrum[];
}) {
  const series = names.map((name, i) => ({
    name,
    points: [...(spectra[i]?.frequencyHz ?? [])].map((x, k) => ({
      x,
      y: Math.max(floor, spectra[i].density[k]),
    })),
  }));
  return (
    <LineFigure
      description="Amplitude density of the signal through each setting over frequency"
      series={series}
      x={{
        label: 'Frequency',
        unit: 'Hz',
        scale: 'log',
        domain: [0.5, 1000],
        ticks: [0.5, 1, 5, 10, 40, 150, 500],
      }}
      y={{
        label: 'Amplitude density',
        unit: 'µV/√Hz',
        scale: 'log',
        domain: [floor, 1000],
        ticks: [0.01, 0.1, 1, 10, 100, 1000],
      }}
    />
  );
}
