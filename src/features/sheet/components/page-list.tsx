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

/** Room of a thumbnail, px: as wide as its column, and smaller where pages stand in a row. */
const roomsPx = { column: { width: 182, height: 129 }, row: { width: 130, height: 92 } } as const;

/** The pages in small: a column beside the desk, or a row above it. */
export function PageList({ pages, chosen, inColumn, onChoose, children }: PageListProps) {
  const room = inColumn ? roomsPx.column : roomsPx.row;
  return (
    <nav
      aria-label="Pages"
      className={classNames(
        'min-w-0 border-rule',
        inColumn
          ? 'border-r'
          : 'flex flex-col items-start gap-3 border-b px-4 py-3 tablet:flex-row tablet:gap-5 tablet:px-6',
      )}
    >
      <div className={inColumn ? 'sticky top-0 max-h-dvh overflow-y-auto px-5 py-5' : 'contents'}>
        <ol
          className={classNames(
            'flex gap-4',
            inColumn ? 'flex-col' : '-m-1 max-w-full min-w-0 overflow-x-auto p-1',
          )}
        >
          {pages.map((page, i) => {
            const isChosen = i + 1 === chosen;
            return (
              <li key={i}>
                <button
                  type="button"
                  aria-current={isChosen ? 'page' : undefined}
                  onClick={() => onChoose(i + 1)}
                  className="block text-left"
                  style={{ width: room.width + 2 }}
                >
                  <span
                    className={classNames(
                      'flex justify-center border bg-sunk',
                      isChosen ? 'border-teal outline-2 outline-teal' : 'border-rule-strong',
                    )}
                  >
                    <PageCanvas
                      page={page}
                      pxPerMm={Math.min(room.width / page.widthMm, room.height / page.heightMm)}
                    />
                  </span>
                  <span className="mt-1.5 flex justify-between gap-2 text-dense">
                    <span
                      className={classNames(
                        'min-w-0 break-words',
                        isChosen && 'font-semibold text-teal-dark',
                      )}
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
        <div className={inColumn ? 'mt-5' : 'shrink-0 tablet:self-center'}>{children}</div>
      </div>
    </nav>
  );
}
