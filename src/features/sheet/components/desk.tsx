import { useRef, useState } from 'react';
import type { SheetPage } from '../../../../shared/paper/pages/sheet-document';
import type { PageSetup } from '../../../../shared/parameters/page-setup';
import { pageFrame } from '../../../../shared/paper/pages/page-frame';
import { Segments } from '../../../components/segments';
import { useElementWidth } from '../../../lib/use-element-width';
import { deskScale, percentOf, type DeskView } from '../state/desk-scale';
import { PageCanvas } from './page-canvas';

interface DeskProps {
  /** null while it is drawn. */
  page: SheetPage | null;
  setup: PageSetup;
  pages: number;
}

const views = [
  { value: 'whole', label: 'Whole page' },
  { value: 'close', label: 'Closer' },
] as const satisfies { value: DeskView; label: string }[];

/** Paper as large as the page will be, with the line where a trace is about to appear. */
function BlankPage({ widthMm, heightMm, pxPerMm }: { widthMm: number; heightMm: number; pxPerMm: number }) {
  return (
    <div
      role="status"
      className="flex items-center bg-white px-[8%]"
      style={{ width: widthMm * pxPerMm, height: heightMm * pxPerMm }}
    >
      <span className="sr-only">Drawing the pages …</span>
      <span aria-hidden="true" className="grow border-t-2 border-dotted border-edge" />
    </div>
  );
}

/** The page on its desk, and at what scale the screen shows it. */
export function Desk({ page, setup, pages }: DeskProps) {
  const [view, setView] = useState<DeskView>('whole');
  const area = useRef<HTMLDivElement>(null);
  const widthPx = useElementWidth(area);
  const { widthMm, heightMm } = page ?? pageFrame(setup);
  const pxPerMm = deskScale(view, { widthMm, heightMm }, widthPx, window.devicePixelRatio || 1);
  const paper = `${setup.paper === 'a4' ? 'A4' : 'Letter'} ${setup.orientation}`;
  return (
    <section aria-label="Page" className="flex min-w-0 grow flex-col bg-sunk px-4 py-5 tablet:px-6">
      <div
        ref={area}
        role="group"
        aria-label="Desk"
        tabIndex={view === 'close' ? 0 : undefined}
        className={view === 'close' ? 'max-h-[80dvh] min-w-0 overflow-auto' : 'min-w-0'}
      >
        {widthPx > 0 && (
          <div className="mx-auto w-fit shadow-float">
            {page ? (
              <PageCanvas page={page} pxPerMm={pxPerMm} label={`${page.label}. ${page.description}`} />
            ) : (
              <BlankPage widthMm={widthMm} heightMm={heightMm} pxPerMm={pxPerMm} />
            )}
          </div>
        )}
      </div>
      <div className="mt-5 flex flex-wrap items-center justify-center gap-x-5 gap-y-2">
        <p className="text-dense text-ink-3">
          {paper} at {percentOf(pxPerMm)} %. On paper 1 mm is 1 mm: print at actual size.
          {pages > 0 && ` ${pages === 1 ? '1 page' : `${pages} pages`}.`}
        </p>
        <Segments label="On the desk" small value={view} options={views} onChange={setView} />
      </div>
    </section>
  );
}
