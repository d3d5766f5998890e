import { useLayoutEffect, useRef, type KeyboardEvent, type PointerEvent } from 'react';
import type { GridTint } from '../../../../shared/paper/tokens';
import type { TintedColumn } from '../canvas/beat-columns';
import { paintCalipers } from '../canvas/calipers';
import { paintGrid, type ScreenWindow } from '../../../lib/canvas/paint-grid';
import { paintColumns, paintRow } from '../canvas/paint';
import { prepareCanvas } from '../../../lib/canvas/prepare-canvas';
import type { RowLayout } from '../canvas/rows';
import { pxToTime, type ScreenScale } from '../../../lib/canvas/scale';
import type { TraceChoice } from '../state/view-state';
import type { Calipers } from './use-calipers';

export interface StripCanvasProps {
  layout: RowLayout;
  scale: ScreenScale;
  scrollPx: number;
  widthPx: number;
  durationS: number;
  speedMmPerS: number;
  tint: GridTint;
  trace: TraceChoice;
  columns: readonly TintedColumn[];
  /** null when the calipers are put away. */
  calipers: Calipers | null;
  label: string;
  onBeatStep(step: -1 | 1): void;
  onTimePicked(timeS: number): void;
  /** null: the pointer left. */
  onTimeHovered(timeS: number | null): void;
}

/** One px of the strip as a step of the calipers' arrow keys; ten with Shift. */
const bigStep = 10;

/** The strip in layers: paper, traces, then columns and calipers; each is repainted only when it changes. */
export function StripCanvas(props: StripCanvasProps) {
  const { layout, scale, scrollPx, widthPx, durationS, speedMmPerS, tint, trace, columns, calipers, label } =
    props;
  const base = useRef<HTMLCanvasElement>(null);
  const overlay = useRef<HTMLCanvasElement>(null);
  const marks = calipers?.marks ?? null;
  const { heightPx } = layout;

  // In the commit itself, not after it: a passive effect would cost the preview a frame.
  useLayoutEffect(() => {
    if (!base.current || widthPx === 0) return;
    const context = prepareCanvas(base.current, widthPx, heightPx);
    if (!context) return;
    const window: ScreenWindow = { scrollPx, widthPx, heightPx };
    paintGrid(context, scale, window, tint);
    for (const row of layout.rows) paintRow(context, scale, window, row, trace);
    performance.mark('strip-painted');
  }, [layout, scale, scrollPx, widthPx, heightPx, tint, trace]);

  useLayoutEffect(() => {
    if (!overlay.current || widthPx === 0) return;
    const context = prepareCanvas(overlay.current, widthPx, heightPx);
    if (!context) return;
    const window: ScreenWindow = { scrollPx, widthPx, heightPx };
    paintColumns(context, scale, window, columns);
    if (marks) paintCalipers(context, scale, window, marks, durationS, speedMmPerS);
  }, [columns, marks, scale, scrollPx, widthPx, heightPx, durationS, speedMmPerS]);

  const timeAt = (event: PointerEvent<HTMLCanvasElement>): number =>
    pxToTime(scale, event.clientX - event.currentTarget.getBoundingClientRect().left + scrollPx);

  const onKeyDown = (event: KeyboardEvent<HTMLCanvasElement>): void => {
    const direction = event.key === 'ArrowLeft' ? -1 : event.key === 'ArrowRight' ? 1 : 0;
    if (direction !== 0) {
      event.preventDefault();
      if (calipers) calipers.move((direction * (event.shiftKey ? bigStep : 1)) / scale.pxPerS);
      else props.onBeatStep(direction);
    }
    if (calipers && event.key === 'Enter') {
      event.preventDefault();
      const last = calipers.marks?.secondS ?? calipers.marks?.firstS;
      calipers.mark(last === undefined ? durationS / 2 : last + (calipers.marks?.secondS === null ? 0.5 : 0));
    }
    if (calipers && event.key === 'Escape') calipers.clear();
  };

  return (
    <div className="relative" style={{ height: heightPx, width: widthPx }}>
      <canvas ref={base} aria-hidden="true" className="absolute inset-0 block h-full w-full" />
      <canvas
        ref={overlay}
        role="img"
        aria-label={label}
        tabIndex={0}
        className="absolute inset-0 block h-full w-full focus-visible:outline-offset-[-2px]"
        style={{ cursor: calipers ? 'crosshair' : 'default' }}
        onPointerDown={(event) => {
          if (calipers) calipers.mark(timeAt(event));
          else props.onTimePicked(timeAt(event));
        }}
        onPointerMove={(event) => event.pointerType === 'mouse' && props.onTimeHovered(timeAt(event))}
        onPointerLeave={() => props.onTimeHovered(null)}
        onKeyDown={onKeyDown}
      />
    </div>
  );
}
