import { useLayoutEffect, useMemo, useRef, type PointerEvent } from 'react';
import type { StripRecording } from '../../../../shared/engine/render';
import { ladderOf } from '../../../../shared/ladder/ladder';
import { sensingWindows } from '../../../../shared/ladder/sensing-windows';
import { ladderHeightMm, ladderItems } from '../../../../shared/paper/ladder';
import type { TintedColumn } from '../canvas/beat-columns';
import { paintColumns } from '../canvas/paint';
import { paintDrawing } from '../../../lib/canvas/paint-drawing';
import { prepareCanvas } from '../../../lib/canvas/prepare-canvas';
import { pxToTime, type ScreenScale } from '../../../lib/canvas/scale';

interface LadderCanvasProps {
  recording: StripRecording;
  scale: ScreenScale;
  /** Pixels to a millimetre of the ladder's own height; zoom stretches it sideways only. */
  pxPerMm: number;
  scrollPx: number;
  widthPx: number;
  /** Whether the device's windows are drawn behind the ladder. */
  windows: boolean;
  columns: readonly TintedColumn[];
  onTimePicked(timeS: number): void;
  onTimeHovered(timeS: number | null): void;
}

const fullNames = ['Atria', 'AV junction', 'Ventricles'] as const;
const shortNames = ['A', 'AV', 'V'] as const;
/** Size of captions on a screen, px. */
const captionPx = 12;
/** Room that the full names need, px. */
const namesPx = 78;

/** The ladder diagram under the strip, on the same time axis. */
export function LadderCanvas(props: LadderCanvasProps) {
  const { recording, scale, pxPerMm, scrollPx, widthPx, windows, columns } = props;
  const canvas = useRef<HTMLCanvasElement>(null);
  const heightPx = Math.ceil(ladderHeightMm * pxPerMm);
  const { events, parameters } = recording;
  const { durationS, pacing } = parameters;
  const marks = useMemo(() => ladderOf(events), [events]);
  const drawn = useMemo(
    () => (windows ? sensingWindows(events, pacing, durationS) : []),
    [windows, events, pacing, durationS],
  );

  useLayoutEffect(() => {
    if (!canvas.current || widthPx === 0) return;
    const context = prepareCanvas(canvas.current, widthPx, heightPx);
    if (!context) return;
    paintColumns(context, scale, { scrollPx, widthPx, heightPx }, columns);
    const items = ladderItems(marks, drawn, {
      xMm: (scale.leftPx - scrollPx) / pxPerMm,
      topMm: 0,
      fromS: 0,
      toS: durationS,
      mmPerS: scale.pxPerS / pxPerMm,
      names: scale.leftPx > namesPx ? fullNames : shortNames,
      captionMm: captionPx / pxPerMm,
      namesXMm: (Math.min(16, scale.leftPx * 0.2) - scrollPx) / pxPerMm,
    });
    paintDrawing(context, items, pxPerMm);
  }, [marks, drawn, columns, scale, pxPerMm, scrollPx, widthPx, heightPx, durationS]);

  const timeAt = (event: PointerEvent<HTMLCanvasElement>): number =>
    pxToTime(scale, event.clientX - event.currentTarget.getBoundingClientRect().left + scrollPx);

  return (
    <canvas
      ref={canvas}
      role="img"
      aria-label="Ladder diagram: atria, AV junction, ventricles and stimuli on the strip's time axis. The reading says the same in words."
      className="block"
      style={{ width: widthPx, height: heightPx }}
      onPointerDown={(event) => props.onTimePicked(timeAt(event))}
      onPointerMove={(event) => event.pointerType === 'mouse' && props.onTimeHovered(timeAt(event))}
      onPointerLeave={() => props.onTimeHovered(null)}
    />
  );
}
