import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import type { Strip } from '../../../shared/api/strips';
import type { StripListResponse, StripSort } from '../../../shared/api/strip-list';
import { courseGroups } from '../../../shared/gallery/course';
import { deleteStrip, duplicateStrip, restoreStrip, stripKeys, stripListQuery } from '../../api/strips';
import { Button, buttonClass } from '../../components/button';
import { Drawer } from '../../components/drawer';
import { ConfirmDialog } from '../../components/dialog';
import { EmptyState } from '../../components/empty-state';
import { Notice } from '../../components/notice';
import { SearchBox } from '../../components/search-box';
import { Segments } from '../../components/segments';
import { SelectField } from '../../components/select-field';
import { useToast } from '../../components/toast';
import { paths } from '../../lib/paths';
import { Filters } from './filters';
import { readLibraryState, writeLibraryState } from './library-query';
import { StripCard, type StripActions } from './strip-card';
import { ImportDialog } from './presets/import-dialog';
import { usePresetFiles } from './presets/use-preset-files';
import { StripTable } from './strip-table';

const sortOptions = [
  { value: 'course', label: 'Course order' },
  { value: 'title', label: 'Title' },
  { value: 'updated', label: 'Last changed' },
] as const satisfies { value: StripSort; label: string }[];

function Cards({
  strips,
  grouped,
  actions,
}: {
  strips: readonly Strip[];
  grouped: boolean;
  actions: StripActions;
}) {
  const grid = 'grid gap-x-5 gap-y-4 tablet:grid-cols-2 wide:grid-cols-3';
  if (!grouped) {
    return (
      <div className={grid}>
        {strips.map((strip) => (
          <StripCard key={strip.id} strip={strip} actions={actions} />
        ))}
      </div>
    );
  }
  const sections = [...courseGroups, { id: null, title: 'Not in the course' }]
    .map((group) => ({ ...group, strips: strips.filter((strip) => strip.group === group.id) }))
    .filter((group) => group.strips.length > 0);
  return (
    <>
      {sections.map((group) => (
        <section key={group.id ?? 'none'} aria-label={group.title} className="mb-6">
          <div className="mb-2 flex items-center gap-3">
            <h2 className="text-section font-semibold">
              {group.title}{' '}
              <span className="ml-1 font-mono text-caption font-normal text-ink-3">
                {group.strips.length}
              </span>
            </h2>
            <span aria-hidden="true" className="h-px grow bg-rule-strong" />
          </div>
          <div className={grid}>
            {group.strips.map((strip) => (
              <StripCard key={strip.id} strip={strip} actions={actions} />
            ))}
          </div>
        </section>
      ))}
    </>
  );
}

function Pages({ list, onPage }: { list: StripListResponse; onPage(page: number): void }) {
  const last = Math.max(1, Math.ceil(list.total / list.pageSize));
  if (last === 1) return null;
  return (
    <nav aria-label="Pages" className="mt-6 flex items-center gap-3">
      <Button disabled={list.page <= 1} onClick={() => onPage(list.page - 1)}>
        Earlier
      </Button>
      <span className="text-dense text-ink-2">
        Page {list.page} of {last}
      </span>
      <Button disabled={list.page >= last} onClick={() => onPage(list.page + 1)}>
        Later
      </Button>
    </nav>
  );
}

function useStripActions(onSavePreset: StripActions['onSavePreset']): {
  actions: StripActions;
  confirming: Strip | null;
  confirm(): void;
  cancel(): void;
} {
  const navigate = useNavigate();
  const queryClient = useQueryClient();
  const toast = useToast();
  const [confirming, setConfirming] = useState<Strip | null>(null);
  const refresh = () => queryClient.invalidateQueries({ queryKey: stripKeys.all });
  const failed = (error: Error): void => toast(`That did not work. ${error.message}`);
  const restoring = useMutation({ mutationFn: restoreStrip, onSettled: refresh, onError: failed });
  const deleting = useMutation({
    mutationFn: (strip: Strip) => deleteStrip(strip.id),
    onSuccess: (_, strip) =>
      toast('Strip deleted', { label: 'Undo', onClick: () => restoring.mutate(strip.id) }),
    onSettled: refresh,
    onError: failed,
  });
  const duplicating = useMutation({
    mutationFn: (strip: Strip) => duplicateStrip(strip.id),
    onSuccess: (copy) => {
      toast(`“${copy.title}” is yours now`);
      return navigate(paths.strip(copy.id));
    },
    onSettled: refresh,
    onError: failed,
  });
  return {
    actions: {
      onOpen: (strip) => void navigate(paths.strip(strip.id)),
      onSheet: (strip) => void navigate(paths.sheet(strip.id)),
      onDuplicate: (strip) => duplicating.mutate(strip),
      onSavePreset,
      onDelete: setConfirming,
    },
    confirming,
    confirm: () => {
      if (confirming) deleting.mutate(confirming);
      setConfirming(null);
    },
    cancel: () => setConfirming(null),
  };
}

/** Every strip one may see: in the order of the course, by search and filters, as cards or as a table. */
export function StripLibrary() {
  const [search, setSearch] = useSearchParams();
  const { query, view } = readLibraryState(search);
  const { data: list, error, isPending, refetch } = useQuery(stripListQuery(query));
  const [importing, setImporting] = useState(false);
  const presets = usePresetFiles();
  const { actions, confirming, confirm, cancel } = useStripActions((strip) =>
    presets.save({ ids: [strip.id] }),
  );
  const change = (changed: Record<string, string | string[] | null>): void =>
    setSearch((current) => writeLibraryState(current, changed), { replace: true });
  const filters = { query, facets: list?.facets ?? null, onChange: change };
  const direction = query.direction ?? (query.sort === 'updated' ? 'descending' : 'ascending');
  const sortBy = (sort: StripSort): void => {
    const turned = sort === query.sort && direction === 'ascending' ? 'descending' : 'ascending';
    change({ sort, direction: sort === query.sort ? turned : null });
  };
  const saveShown = (): void => {
    const { search: words, tag, keptBy, group } = query;
    presets.save({ filter: { search: words, tag, keptBy, group } });
  };
  const filtered =
    query.search !== '' || query.tag.length > 0 || query.keptBy !== 'everyone' || query.group !== undefined;
  return (
    <div className="grid grow desk:grid-cols-[200px_minmax(0,1fr)] wide:grid-cols-[214px_minmax(0,1fr)]">
      <aside className="hidden border-r border-rule py-5 pr-4 pl-6 desk:block">
        <Filters {...filters} />
      </aside>
      <main className="min-w-0 px-4 py-5 tablet:px-6 desk:px-7">
        <div className="mb-5 flex flex-wrap items-center gap-3">
          <h1 className="mr-auto text-title font-semibold tracking-[-0.012em]">Strips</h1>
          <SearchBox
            label="Search strips"
            placeholder="Title, tag or teaching point"
            value={query.search}
            onSearch={(words) => change({ search: words === '' ? null : words })}
          />
          <Drawer title="Filters" side="left" className="desk:hidden">
            <Filters {...filters} />
          </Drawer>
          <Segments
            label="View"
            value={view}
            options={[
              { value: 'cards', label: 'Cards' },
              { value: 'table', label: 'Table' },
            ]}
            onChange={(next) => change({ view: next === 'cards' ? null : next })}
          />
          <SelectField
            label="Order"
            value={query.sort}
            options={sortOptions}
            onChange={(sort) => change({ sort: sort === 'course' ? null : sort, direction: null })}
          />
          <span className="ml-auto flex gap-3">
            <Button onClick={() => setImporting(true)}>Import presets</Button>
            <Link to={paths.newStrip()} className={buttonClass('primary')}>
              New strip
            </Link>
          </span>
        </div>
        {error && (
          <div className="mb-5 flex flex-wrap items-center gap-3">
            <Notice kind="red" title="The strips could not be listed.">
              {error.message}
            </Notice>
            <Button onClick={() => void refetch()}>Try again</Button>
          </div>
        )}
        {isPending && !error && <p className="text-body text-ink-3">Looking for strips …</p>}
        {list && list.strips.length === 0 && (
          <EmptyState
            title={filtered ? 'No strip fits' : 'No strips yet'}
            text={
              filtered
                ? 'Nothing has all of these words, tags and places.'
                : 'Start from a plain sinus rhythm.'
            }
          >
            {filtered ? (
              <Button onClick={() => setSearch({})}>Clear search and filters</Button>
            ) : (
              <Link to={paths.newStrip()} className={buttonClass('plain')}>
                New strip
              </Link>
            )}
          </EmptyState>
        )}
        {list &&
          list.strips.length > 0 &&
          (view === 'table' ? (
            <StripTable
              strips={list.strips}
              sort={query.sort}
              direction={direction}
              onSort={sortBy}
              actions={actions}
            />
          ) : (
            <Cards strips={list.strips} grouped={query.sort === 'course'} actions={actions} />
          ))}
        {list && <Pages list={list} onPage={(page) => change({ page: String(page) })} />}
        {list && (
          <div className="mt-4 flex flex-wrap items-center gap-x-4 gap-y-2">
            <p role="status" className="text-caption text-ink-3">
              {list.total === 1 ? '1 strip' : `${list.total} strips`}
            </p>
            {list.total > 0 && (
              <Button small kind="quiet" disabled={presets.saving} onClick={saveShown}>
                {list.total === 1 ? 'Save it as a preset file' : `Save all ${list.total} as a preset file`}
              </Button>
            )}
          </div>
        )}
      </main>
      {importing && (
        <ImportDialog
          onClose={() => setImporting(false)}
          onDone={(result) => {
            setImporting(false);
            presets.announce(result);
          }}
        />
      )}
      <ConfirmDialog
        open={confirming !== null}
        title={`Delete “${confirming?.title ?? ''}”?`}
        description="You can undo this right after."
        safe="Keep it"
        action="Delete"
        danger
        onAct={confirm}
        onClose={cancel}
      />
    </div>
  );
}
