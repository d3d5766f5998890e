import { compareMarkers } from '../../../../shared/engine/recorder/stimulus-detector';
import type { MarkerRow } from '../../../../shared/recorder-bench/marker-figures';
import { markerNoiseMv } from '../../../../shared/recorder-bench/marker-figures';
import type { StripOnBench } from '../../../../shared/recorder-bench/strip-traces';
import { Button } from '../../../components/button';
import { Segments } from '../../../components/segments';

interface MarkerPanelProps {
  strip: StripOnBench | null;
  shown: boolean;
  onShow(shown: boolean): void;
  rows: readonly (MarkerRow | null)[];
  wanted: boolean;
  onMeasure(): void;
}

const offOn = [
  { value: 'off', label: 'Off' },
  { value: 'on', label: 'On' },
] as const;

const share = (value: number | null): string => (value === null ? '–' : `${value.toFixed(1)} %`);

function OwnFigures({ strip }: { strip: StripOnBench }) {
  const given = strip.events.flatMap((event) => (event.type === 'stimulus' ? [event.timeS] : []));
  const { hits, falseMarkers } = compareMarkers(strip.stimulusMarkersS, given);
  if (given.length === 0 && falseMarkers === 0)
    return <p>No stimulus is given on this strip, and none is marked.</p>;
  return (
    <p>
      On this strip {hits} of {given.length} stimuli are marked;{' '}
      {falseMarkers === 0
        ? 'no marker is'
        : falseMarkers === 1
          ? 'one marker is'
          : `${falseMarkers} markers are`}{' '}
      false.
    </p>
  );
}

function NoiseTable({ rows }: { rows: MarkerPanelProps['rows'] }) {
  return (
    <div className="overflow-x-auto">
      <table className="w-full text-dense">
        <thead>
          <tr className="border-b border-edge text-left text-ink-2">
            <th className="py-1.5 pr-3 font-medium">Muscle noise</th>
            <th className="py-1.5 pl-3 text-right font-medium">Stimuli</th>
            <th className="py-1.5 pl-3 text-right font-medium">Sensitivity</th>
            <th className="py-1.5 pl-3 text-right font-medium">Positive predictive value</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row, i) => (
            <tr key={markerNoiseMv[i]} className="border-b border-rule font-mono">
              <th scope="row" className="py-1.5 pr-3 text-left font-normal">
                {markerNoiseMv[i]} mV
              </th>
              <td className="py-1.5 pl-3 text-right">{row ? row.given : '…'}</td>
              <td className="py-1.5 pl-3 text-right">{row ? share(row.sensitivityPercent) : '…'}</td>
              <td className="py-1.5 pl-3 text-right">{row ? share(row.positivePredictivePercent) : '…'}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** The stimulus marker: on a line of its own, with its own figures. */
export function MarkerPanel({ strip, shown, onShow, rows, wanted, onMeasure }: MarkerPanelProps) {
  return (
    <section aria-label="Stimulus marker" className="flex flex-col gap-2.5 text-body">
      <div className="flex items-center justify-between gap-3 border-b border-edge pb-1.5">
        <h2 className="text-section font-semibold">Stimulus marker</h2>
        {strip && (
          <Segments
            small
            label="Stimulus marker"
            value={shown ? 'on' : 'off'}
            options={offOn}
            onChange={(value) => onShow(value === 'on')}
          />
        )}
      </div>
      <p className="text-ink-2">
        A detector watches how fast the signal changes, before the band-limit, and marks what it takes for a
        stimulus. The mark is a stroke under the traces, never part of them. It can miss one, and two given at
        the same moment are one to it.
      </p>
      {strip && <OwnFigures strip={strip} />}
      {wanted ? (
        <NoiseTable rows={rows} />
      ) : (
        <div>
          <Button small onClick={onMeasure}>
            Measure it over the whole gallery
          </Button>
        </div>
      )}
    </section>
  );
}
