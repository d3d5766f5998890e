import { useEffect, useRef } from 'react';
import type { SheetPage } from '../../../../shared/paper/pages/sheet-document';
import { paintPage } from '../../../lib/canvas/paint-page';
import { usePaperFonts } from '../../../lib/canvas/paper-fonts';

interface PageCanvasProps {
  page: SheetPage;
  /** CSS pixels a millimetre. */
  pxPerMm: number;
  /** For people who cannot see it; decoration without. */
  label?: string;
}

/** A page painted in true proportion. */
export function PageCanvas({ page, pxPerMm, label }: PageCanvasProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const fonts = usePaperFonts();
  const ratio = window.devicePixelRatio || 1;
  const widthPx = page.widthMm * pxPerMm;
  const heightPx = page.heightMm * pxPerMm;

  useEffect(() => {
    const element = canvas.current;
    const context = element?.getContext('2d');
    if (!element || !context) return;
    element.width = Math.round(widthPx * ratio);
    element.height = Math.round(heightPx * ratio);
    paintPage(context, page, pxPerMm * ratio);
  }, [page, pxPerMm, ratio, widthPx, heightPx, fonts]);

  return (
    <canvas
      ref={canvas}
      role={label ? 'img' : undefined}
      aria-label={label}
      aria-hidden={label ? undefined : true}
      className="block max-w-none bg-white"
      style={{ width: widthPx, height: heightPx }}
    />
  );
}
