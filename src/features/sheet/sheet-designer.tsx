import { useState } from 'react';
import { mostSheetStrips } from '../../../shared/api/sheets';
import type { Strip } from '../../../shared/api/strips';
import type { PageSetup } from '../../../shared/parameters/page-setup';
import { Button } from '../../components/button';
import { Drawer } from '../../components/drawer';
import { Notice } from '../../components/notice';
import { useMediaQuery } from '../../lib/use-media-query';
import { AddStripDialog } from './components/add-strip-dialog';
import { Desk } from './components/desk';
import { DocumentNotes } from './components/document-notes';
import { OptionsPanel } from './components/options-panel';
import { PageList } from './components/page-list';
import { PrintPages } from './components/print-pages';
import { SheetTitleBar } from './components/sheet-title-bar';
import { StripList } from './components/strip-list';
import { useSheetDocument } from './state/use-sheet-document';
import { useSheetFiles } from './state/use-sheet-files';

/** A strip that could not be fetched. */
export interface MissingStrip {
  id: string;
  words: string;
}

export interface SheetDesignerProps {
  /** In the order of their pages; at least one. */
  strips: readonly Strip[];
  /** Strips still being fetched. */
  fetching: number;
  missing: readonly MissingStrip[];
  /** Title of the strip that has unsaved changes in this tab. */
  unsaved: readonly string[];
  setup: PageSetup;
  organisation: string;
  /** From 1; past the end is the last. */
  page: number;
  onSetup(change: Partial<PageSetup>): void;
  onStrips(stripIds: string[]): void;
  onPage(page: number): void;
}

const columnQuery = '(min-width: 80rem)';
const deskQuery = '(min-width: 64rem)';

function Messages({
  designer: { missing, unsaved, strips, onStrips },
  problem,
  notes,
}: {
  designer: SheetDesignerProps;
  problem: string | null;
  notes: readonly string[];
}) {
  if (missing.length + unsaved.length + notes.length === 0 && problem === null) return null;
  return (
    <div className="flex flex-col gap-2 bg-sunk px-4 pt-4 tablet:px-6">
      {problem && <Notice kind="red" title={problem} />}
      {missing.map(({ id, words }) => (
        <div key={id} className="flex flex-wrap items-center gap-3">
          <Notice kind="red" title="A strip of these sheets is not there.">
            {words} The pages show the others.
          </Notice>
          <Button small onClick={() => onStrips(strips.map((strip) => strip.id).filter((one) => one !== id))}>
            Take it off
          </Button>
        </div>
      ))}
      {unsaved.map((title) => (
        <Notice key={title} kind="teal" title="The sheet shows the strip as saved.">
          “{title}” has changes in this tab that are not saved.
        </Notice>
      ))}
      <DocumentNotes notes={notes} />
    </div>
  );
}

/** The paper sheets of strips: pages, the page on its desk, options, and the files made of them. */
export function SheetDesigner(props: SheetDesignerProps) {
  const { strips, fetching, setup, organisation, onSetup, onStrips, onPage } = props;
  const { document, waiting, problem } = useSheetDocument(strips, setup, organisation);
  const stripIds = strips.map(({ id }) => id);
  const files = useSheetFiles(stripIds, setup, document);
  const [adding, setAdding] = useState(false);
  const inColumn = useMediaQuery(columnQuery);
  const isWide = useMediaQuery(deskQuery);
  const pages = document?.pages ?? [];
  const page = Math.min(props.page, Math.max(1, pages.length));
  const ready = document !== null && waiting + fetching === 0 && problem === null;
  const isFull = strips.length >= mostSheetStrips;
  const options = (
    <div className="flex flex-col gap-5">
      <OptionsPanel
        setup={setup}
        marked={strips.some(({ parameters }) => parameters.recorder.stimulusMarker)}
        onChange={onSetup}
      />
      <StripList strips={strips} onChange={onStrips} />
    </div>
  );
  return (
    <main className="flex min-w-0 grow flex-col">
      <SheetTitleBar
        strips={strips}
        sheets={setup.sheets}
        files={files}
        page={page}
        pages={pages.length}
        ready={ready}
      />
      <div className="grid grow grid-cols-[minmax(0,1fr)] grid-rows-[auto_1fr] desk:grid-cols-[minmax(0,1fr)_264px] wide:grid-cols-[224px_minmax(0,1fr)_264px] wide:grid-rows-1">
        <PageList pages={pages} chosen={page} inColumn={inColumn} onChoose={onPage}>
          <div className="flex flex-wrap items-center gap-2">
            <Button small disabled={isFull} onClick={() => setAdding(true)}>
              Add a strip
            </Button>
            {!isWide && (
              <Drawer title="Options" side="right">
                {options}
              </Drawer>
            )}
            {isFull && (
              <span className="text-caption text-ink-3">{mostSheetStrips} strips are the most.</span>
            )}
          </div>
        </PageList>
        <div className="flex min-w-0 flex-col">
          <Messages designer={props} problem={problem} notes={document?.notes ?? []} />
          {waiting + fetching > 0 && pages.length > 0 && (
            <p role="status" className="bg-sunk px-4 pt-4 text-dense text-ink-3 tablet:px-6">
              Drawing {waiting + fetching === 1 ? 'one more strip' : `${waiting + fetching} more strips`} …
            </p>
          )}
          <Desk page={pages[page - 1] ?? null} setup={setup} pages={pages.length} />
        </div>
        {isWide && (
          <aside
            aria-label="Options"
            className="border-l border-rule desk:row-span-2 desk:row-start-1 desk:col-start-2 wide:col-start-3 wide:row-span-1"
          >
            <div className="sticky top-0 max-h-dvh overflow-y-auto px-5 py-5">{options}</div>
          </aside>
        )}
      </div>
      {adding && (
        <AddStripDialog
          taken={stripIds}
          onAdd={(id) => {
            setAdding(false);
            onStrips([...stripIds, id]);
          }}
          onClose={() => setAdding(false)}
        />
      )}
      <PrintPages pages={pages} />
    </main>
  );
}
