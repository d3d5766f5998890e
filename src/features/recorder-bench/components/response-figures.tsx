import { useState } from 'react';
import type { Responses } from '../../../../shared/recorder-bench/responses';
import type { Spectrum } from '../../../../shared/recorder-bench/spectrum';
import { Segments } from '../../../components/segments';
import { Tabs } from '../../../components/tabs';
import { MagnitudeFigure, type MagnitudeScale } from '../charts/magnitude-figure';
import { SpectrumFigure } from '../charts/spectrum-figure';
import { DelayFigure, ImpulseFigure, StepFigure } from '../charts/time-figures';

const figures = [
  { value: 'magnitude', label: 'Magnitude' },
  { value: 'impulse', label: 'Impulse' },
  { value: 'step', label: 'Step' },
  { value: 'delay', label: 'Group delay' },
  { value: 'spectrum', label: 'Spectrum' },
] as const;
export type FigureChoice = (typeof figures)[number]['value'];

const scales = [
  { value: 'percent', label: '%' },
  { value: 'decibel', label: 'dB' },
] as const;

interface ResponseFiguresProps {
  names: readonly string[];
  responses: readonly (Responses | null)[];
  spectra: readonly Spectrum[];
}

/** What the running filters do, as figures. */
export function ResponseFigures({ names, responses, spectra }: ResponseFiguresProps) {
  const [choice, setChoice] = useState<FigureChoice>('magnitude');
  const [scale, setScale] = useState<MagnitudeScale>('percent');
  const waiting = choice !== 'spectrum' && responses.some((one) => one === null);
  return (
    <section aria-label="Responses" className="min-w-0">
      <h2 className="text-section font-semibold">Measured from the running recorder</h2>
      <div className="mt-2">
        <Tabs label="Figure" value={choice} options={figures} onChange={setChoice}>
          <div className="pt-3">
            {waiting && (
              <p role="status" className="mb-2 text-caption text-ink-3">
                Measuring …
              </p>
            )}
            {choice === 'magnitude' && (
              <>
                <MagnitudeFigure names={names} responses={responses} scale={scale} />
                <div className="mt-1 flex flex-wrap items-center justify-between gap-3">
                  <p className="text-caption text-ink-3">
                    Shaded: outside the limits of the diagnostic sine series (IEC 60601-2-25:2011, table
                    201.107). Dotted: −3 dB. Beyond half of the sample rate, what folds back.
                  </p>
                  <Segments small label="Scale" value={scale} options={scales} onChange={setScale} />
                </div>
              </>
            )}
            {choice === 'impulse' && <ImpulseFigure names={names} responses={responses} />}
            {choice === 'step' && <StepFigure names={names} responses={responses} />}
            {choice === 'delay' && <DelayFigure names={names} responses={responses} />}
            {choice === 'spectrum' && <SpectrumFigure names={names} spectra={spectra} />}
          </div>
        </Tabs>
      </div>
    </section>
  );
}
