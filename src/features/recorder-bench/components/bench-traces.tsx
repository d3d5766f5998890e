import { useEffect, useLayoutEffect, useMemo, useRef, type KeyboardEvent, type PointerEvent } from 'react';
import type { MeasuredBeat } from '../../../../shared/recorder-bench/beat-measures';
import { TimeAxis } from '../../../components/time-axis';
import { difference, type BenchResult } from '../../../../shared/recorder-bench/bench-result';
import { settingWords, type BenchSetting } from '../../../../shared/recorder-bench/bench-setting';
import { paintGrid } from '../../../lib/canvas/paint-grid';
import { prepareCanvas } from '../../../lib/canvas/prepare-canvas';
import { desktopPxPerMm, phonePxPerMm, pxToTime } from '../../../lib/canvas/scale';
import { tabletQuery, useMediaQuery } from '../../../lib/use-media-query';
import { layoutBench, type BenchRow } from '../canvas/bench-layout';
import { paintMarkerLines, paintMarks, paintRows } from '../canvas/paint-bench';

export interface BenchTracesProps {
  result: BenchResult;
  settings: readonly BenchSetting[];
  view: 'traces' | 'difference';
  beat: MeasuredBeat | null;
  marker: boolean;
  /** mm/mV; null: what fits. */
  gain: number | null;
  label: string;
  onBeat(number: number): void;
}

/** Traces are shown at the usual gain; differences as large as they fit. */
const mostGain = { traces: 10, difference: 200 } as const;
const markerHeightPx = 42;
/** A beat's column begins this long before its start, s. */
const columnLeadS = 0.12;

function traceRows({ result, settings, view }: BenchTracesProps): BenchRow[] {
  const traces = result.traces.slice(0, settings.length);
  if (view === 'traces') {
    return traces.map((trace, i) => ({ ...settingWords(settings[i]), ...trace }));
  }
  const first = settingWords(settings[0]).name;
  return traces.slice(1).map((trace, i) => {
    const { name, band } = settingWords(settings[i + 1]);
    return {
      name: `${name} less ${first}`,
      band,
      sampleRateHz: traces[0].sampleRateHz,
      samplesMv: difference(trace, traces[0]),
    };
  });
}

function nearestBeat(beats: readonly MeasuredBeat[], timeS: number): MeasuredBeat | null {
  const started = beats.filter(({ startS }) => startS - columnLeadS <= timeS);
  return started.at(-1) ?? beats.at(0) ?? null;
}

/** The traces one above the other on one time axis, at one gain; clicking or arrow keys choose the beat. */
export function BenchTraces(props: BenchTracesProps) {
  const { result, beat, marker, label, onBeat } = props;
  const { beats, strip, durationS } = result;
  const base = useRef<HTMLCanvasElement>(null);
  const overlay = useRef<HTMLCanvasElement>(null);
  const markerCanvas = useRef<HTMLCanvasElement>(null);
  const pxPerMm = useMediaQuery(tabletQuery) ? desktopPxPerMm : phonePxPerMm;
  const { view, settings, gain } = props;
  const layout = useMemo(
    () =>
      layoutBench(
        traceRows({ result, settings, view } as BenchTracesProps),
        durationS,
        pxPerMm,
        gain === null ? { most: mostGain[view] } : { exactly: gain },
      ),
    [result, settings, view, gain, durationS, pxPerMm],
  );
  const { widthPx, heightPx, scale } = layout;
  const next = beat ? beats.find(({ number }) => number === beat.number + 1) : undefined;
  const fromS = beat ? Math.max(0, beat.startS - columnLeadS) : 0;
  const toS = Math.min(durationS, next ? next.startS - columnLeadS : durationS);

  useLayoutEffect(() => {
    const context = base.current && prepareCanvas(base.current, widthPx, heightPx);
    if (!context) return;
    paintGrid(context, scale, { scrollPx: 0, widthPx, heightPx }, 'slate');
    paintRows(context, layout);
  }, [layout, widthPx, heightPx, scale]);

  useLayoutEffect(() => {
    const context = overlay.current && prepareCanvas(overlay.current, widthPx, heightPx);
    if (!context) return;
    paintMarks(
      context,
      scale,
      { scrollPx: 0, widthPx, heightPx },
      {
        beat: beat ? { fromS, toS } : null,
        spikeS: beat?.spike?.timeS ?? null,
        stS: beat?.stAtS ?? null,
      },
    );
  }, [beat, fromS, toS, scale, widthPx, heightPx]);

  useLayoutEffect(() => {
    if (!strip || !marker) return;
    const context = markerCanvas.current && prepareCanvas(markerCanvas.current, widthPx, markerHeightPx);
    if (!context) return;
    const given = strip.events.flatMap((event) => (event.type === 'stimulus' ? [event.timeS] : []));
    paintMarkerLines(context, scale, widthPx, given, strip.stimulusMarkersS);
  }, [strip, marker, scale, widthPx]);

  // The address bar answers after the key: the next key counts from what the last one asked for.
  const asked = useRef(0);
  useEffect(() => {
    asked.current = beat?.number ?? 0;
  }, [beat]);
  const onKeyDown = (event: KeyboardEvent): void => {
    const step = event.key === 'ArrowLeft' ? -1 : event.key === 'ArrowRight' ? 1 : 0;
    const wanted = beats.find(({ number }) => number === asked.current + step);
    if (step === 0 || !wanted) return;
    event.preventDefault();
    asked.current = wanted.number;
    onBeat(wanted.number);
  };
  const onPointerDown = (event: PointerEvent<HTMLCanvasElement>): void => {
    const left = event.currentTarget.getBoundingClientRect().left;
    const found = nearestBeat(beats, pxToTime(scale, event.clientX - left));
    if (found) onBeat(found.number);
  };

  return (
    <div>
      <div className="overflow-x-auto border-y border-edge bg-sheet" tabIndex={-1}>
        <div style={{ width: widthPx }}>
          <div className="relative" style={{ height: heightPx }}>
            <canvas ref={base} aria-hidden="true" className="absolute inset-0 h-full w-full" />
            <canvas
              ref={overlay}
              role="img"
              aria-label={label}
              tabIndex={0}
              className="absolute inset-0 h-full w-full focus-visible:outline-offset-[-2px]"
              onKeyDown={onKeyDown}
              onPointerDown={onPointerDown}
            />
          </div>
          {strip && marker && (
            <canvas
              ref={markerCanvas}
              aria-hidden="true"
              className="block w-full border-t border-rule"
              style={{ height: markerHeightPx }}
            />
          )}
          <div className="border-t border-rule">
            <TimeAxis scale={scale} durationS={durationS} />
          </div>
        </div>
      </div>
      <p className="mt-1.5 flex flex-wrap gap-x-5 gap-y-1 text-caption text-ink-2">
        {beat?.spike && (
          <span>
            <span
              aria-hidden="true"
              className="mr-1.5 inline-block w-5 border-t-2 border-dotted border-copper align-middle"
            />
            largest stimulus, beat {beat.number}
          </span>
        )}
        {beat?.stAtS && (
          <span>
            <span
              aria-hidden="true"
              className="mr-1.5 inline-block w-5 border-t-2 border-dashed border-plum align-middle"
            />
            ST read here, 80 ms after the QRS
          </span>
        )}
        <span className="ml-auto">
          25 mm/s, {layout.gainMmPerMv} mm/mV. Synthetic teaching strip, not a patient recording
        </span>
      </p>
    </div>
  );
}
