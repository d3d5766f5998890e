import { useMemo, useRef, useState } from 'react';
import type { StripRecording } from '../../../../shared/engine/render';
import { bandwidthLabel } from '../../../../shared/paper/bandwidth-label';
import { leadNames, type LeadName } from '../../../../shared/parameters/sheet';
import { BeatChip } from '../../../components/chip';
import { beatColumns, columnAt, tintedColumns } from '../canvas/beat-columns';
import { caliperWords } from '../canvas/calipers';
import { layoutRows, type Row } from '../canvas/rows';
import { desktopPxPerMm, phonePxPerMm, screenScale, timeToPx } from '../../../lib/canvas/scale';
import type { Preview } from '../state/use-preview';
import type { ViewState } from '../state/view-state';
import { BeatStepper } from './beat-stepper';
import { LadderCanvas } from './ladder-canvas';
import { MarkerLine, markerWords } from './marker-line';
import { StripCanvas } from './strip-canvas';
import { TimeAxis } from '../../../components/time-axis';
import { useCalipers } from './use-calipers';
import { useElementWidth } from '../../../lib/use-element-width';

const phoneWidthPx = 640;

interface StripViewProps {
  preview: Preview;
  view: ViewState;
  onChooseBeats(beats: readonly number[]): void;
  /** The beat under the pointer; null for none. */
  onHoverBeat(beat: number | null): void;
}

function rowsOf(preview: Preview, view: ViewState, leads: readonly LeadName[]): Omit<Row, 'baselinePx'>[] {
  const { recorded, electrodes, compared } = preview;
  const caption = (recording: StripRecording): string | null =>
    compared ? bandwidthLabel(recording.parameters.recorder) : null;
  const row = (lead: LeadName, recording: StripRecording): Omit<Row, 'baselinePx'> => ({
    lead,
    recording,
    electrodes: view.trace === 'recorded' ? null : electrodes,
    caption: caption(recording),
  });
  return leads.flatMap((lead) => [row(lead, recorded), ...(compared ? [row(lead, compared)] : [])]);
}

/** Beats, strip, seconds and ladder on one time axis, in one window that scrolls sideways. */
export function StripView({ preview, view, onChooseBeats, onHoverBeat }: StripViewProps) {
  const frame = useRef<HTMLDivElement>(null);
  const widthPx = useElementWidth(frame);
  const [scrollPx, setScrollPx] = useState(0);
  const { recorded } = preview;
  const { parameters, reading } = recorded;
  const { sheet, durationS } = parameters;
  const calipers = useCalipers(durationS);

  const base = widthPx > 0 && widthPx < phoneWidthPx ? phonePxPerMm : desktopPxPerMm;
  const scale = useMemo(() => screenScale(sheet, base, view.zoom), [sheet, base, view.zoom]);
  const leads = view.twelve ? leadNames : sheet.leads;
  const layout = useMemo(
    () => layoutRows(rowsOf(preview, view, leads), scale),
    [preview, view, leads, scale],
  );
  const columns = useMemo(() => beatColumns(reading.beats, durationS), [reading, durationS]);
  const tinted = useMemo(
    () => tintedColumns(columns, view.chosenBeats, view.hoverBeat),
    [columns, view.chosenBeats, view.hoverBeat],
  );
  const contentPx = Math.max(widthPx, Math.ceil(timeToPx(scale, durationS) + 4 * scale.pxPerMm));

  const choose = (number: number): void => {
    onChooseBeats([number]);
    const column = columns[number - 1];
    const left = timeToPx(scale, column.fromS);
    const right = timeToPx(scale, column.toS);
    const box = frame.current;
    if (box && (left < box.scrollLeft || right > box.scrollLeft + widthPx)) {
      box.scrollTo({ left: left - widthPx / 3 });
    }
  };
  const stepBeat = (step: -1 | 1): void => {
    const last =
      step > 0 ? Math.max(0, ...view.chosenBeats) : Math.min(columns.length + 1, ...view.chosenBeats);
    const number = view.chosenBeats.length === 0 ? (step > 0 ? 1 : columns.length) : last + step;
    if (columns[number - 1]) choose(number);
  };
  const pick = (timeS: number): void => {
    const column = columnAt(columns, timeS);
    onChooseBeats(column ? [column.number] : []);
  };
  const hover = (timeS: number | null): void => {
    const number = timeS === null ? null : (columnAt(columns, timeS)?.number ?? null);
    if (number !== view.hoverBeat) onHoverBeat(number);
  };

  const readout = calipers.marks && caliperWords(calipers.marks, sheet.speedMmPerS);
  const label = `${parameters.title || 'Strip'}: ${leads.join(', ')}, ${durationS} s. ${reading.findings.map((finding) => finding.text).join(' ')} Arrow keys walk the beats.`;
  return (
    <section aria-label="Strip" className="border-b border-edge">
      <div
        ref={frame}
        className="overflow-x-auto overflow-y-hidden"
        onScroll={(event) => setScrollPx(event.currentTarget.scrollLeft)}
      >
        <div className="relative" style={{ width: contentPx }}>
          <ol aria-label="Beats" className="relative h-8">
            {columns.map(({ number, timeS }) => (
              <li
                key={number}
                className="absolute top-1 -translate-x-1/2"
                style={{ left: timeToPx(scale, timeS) }}
              >
                <BeatChip
                  chosen={view.chosenBeats.includes(number)}
                  label={`Beat ${number}`}
                  onClick={() => (view.chosenBeats.includes(number) ? onChooseBeats([]) : choose(number))}
                >
                  {number}
                </BeatChip>
              </li>
            ))}
          </ol>
          <div className="sticky left-0 border-y border-edge" style={{ width: widthPx }}>
            <StripCanvas
              layout={layout}
              scale={scale}
              scrollPx={scrollPx}
              widthPx={widthPx}
              durationS={durationS}
              speedMmPerS={sheet.speedMmPerS}
              tint={sheet.gridTint}
              trace={view.trace}
              columns={tinted}
              calipers={view.calipers ? calipers : null}
              label={label}
              onBeatStep={stepBeat}
              onTimePicked={pick}
              onTimeHovered={hover}
            />
          </div>
          <MarkerLine recording={recorded} scale={scale} />
          <TimeAxis scale={scale} durationS={durationS} />
          <div className="sticky left-0" style={{ width: widthPx }}>
            <LadderCanvas
              recording={recorded}
              scale={scale}
              pxPerMm={base}
              scrollPx={scrollPx}
              widthPx={widthPx}
              windows={view.windows}
              columns={tinted}
              onTimePicked={pick}
              onTimeHovered={hover}
            />
          </div>
        </div>
      </div>
      {recorded.stimulusMarkersS && (
        <p className="px-4 text-caption text-ink-3 tablet:px-6">{markerWords(recorded)}</p>
      )}
      {view.windows && (
        <p className="px-4 text-caption text-ink-3 tablet:px-6">
          Sensing windows: hatched, refractory (atria: AV interval and PVARP; ventricles: refractory period);
          closely hatched, blanking; dotted outline, alert.
        </p>
      )}
      <BeatStepper beats={reading.beats} chosenBeats={view.chosenBeats} onStep={stepBeat} />
      <p
        role="status"
        aria-label="Calipers"
        className={view.calipers ? 'px-4 pb-1 text-dense text-plum tablet:px-6' : 'sr-only'}
      >
        {view.calipers &&
          (readout ??
            'Set two marks on the strip; a third repeats their interval. Keys: arrows move, Enter sets, Escape clears.')}
      </p>
    </section>
  );
}
