import type { ReactNode } from 'react';
import type { SheetPage } from '../../../../shared/paper/pages/sheet-document';
import { classNames } from '../../../lib/class-names';
import { PageCanvas } from './page-canvas';

interface PageListProps {
  pages: readonly SheetPage[];
  /** From 1. */
  chosen: number;
  onChoose(page: number): void;
  inColumn: boolean;
  /** After the last page. */
  children: ReactNode;
}

/** Width of a thumbnail, px: as wide as its column, and narrower where pages stand in a row. */
const thumbnailPx = { column: 184, row: 132 } as const;

function Thumbnail({ page, widthPx }: { page: SheetPage; widthPx: number }) {
  return <PageCanvas page={page} pxPerMm={widthPx / Math.max(page.widthMm, page.heightMm)} />;
}

/** The pages in small: a column beside the desk, or a row above it. */
export function PageList({ pages, chosen, inColumn, onChoose, children }: PageListProps) {
  const widthPx = inColumn ? thumbnailPx.column : thumbnailPx.row;
  return (
    <nav
      aria-label="Pages"
      className={classNames(
        'min-w-0 border-rule',
        inColumn
          ? 'border-r px-5 py-5'
          : 'flex items-start gap-4 overflow-x-auto border-b px-4 py-3 tablet:px-6',
      )}
    >
      <ol className={inColumn ? 'flex flex-col gap-4' : 'flex gap-4'}>
        {pages.map((page, i) => {
          const isChosen = i + 1 === chosen;
          return (
            <li key={i}>
              <button
                type="button"
                aria-current={isChosen ? 'page' : undefined}
                onClick={() => onChoose(i + 1)}
                className="block text-left"
                style={{ width: widthPx }}
              >
                <span
                  className={classNames(
                    'flex justify-center border bg-sunk',
                    isChosen ? 'border-teal outline-2 outline-teal' : 'border-rule-strong',
                  )}
                >
                  <Thumbnail page={page} widthPx={widthPx - 2} />
                </span>
                <span className="mt-1.5 flex justify-between gap-2 text-dense">
                  <span
                    className={classNames('min-w-0 break-words', isChosen && 'font-semibold text-teal-dark')}
                  >
                    {page.label}
                  </span>
                  <span className="font-mono text-ink-3">{i + 1}</span>
                </span>
              </button>
            </li>
          );
        })}
      </ol>
      <div className={inColumn ? 'mt-5' : 'self-center'}>{children}</div>
    </nav>
  );
}
