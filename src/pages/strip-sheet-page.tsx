import { useQueries, useQuery, type UseQueryResult } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { useNavigate, useParams, useSearchParams } from 'react-router-dom';
import type { Strip } from '../../shared/api/strips';
import { pageSetupOf, type PageSetup } from '../../shared/parameters/page-setup';
import { sessionQuery } from '../api/session';
import { stripQuery } from '../api/strips';
import { SheetDesigner, type MissingStrip } from '../features/sheet/sheet-designer';
import {
  readSheetAddress,
  writeSheetAddress,
  type SheetAddress,
} from '../features/sheet/state/sheet-address';
import { readDraft } from '../features/strip-editor/state/draft-storage';
import { paths } from '../lib/paths';

interface Others {
  strips: Strip[];
  missing: Omit<MissingStrip, 'id'>[];
  failedAt: number[];
  fetching: number;
}

function joinOthers(results: UseQueryResult<Strip>[]): Others {
  const failed = results.flatMap(({ error }, i) => (error ? [{ at: i, words: error.message }] : []));
  return {
    strips: results.flatMap(({ data }) => data ?? []),
    missing: failed.map(({ words }) => ({ words })),
    failedAt: failed.map(({ at }) => at),
    fetching: results.filter(({ isPending }) => isPending).length,
  };
}

function hasUnsaved({ id, parameters }: Strip): boolean {
  const draft = readDraft(id);
  return draft !== null && JSON.stringify(draft.parameters) !== JSON.stringify(parameters);
}

/** What was chosen, at once; the address follows, and leads when somebody goes back. */
function useChosen(address: SheetAddress): [SheetAddress, (next: SheetAddress) => void] {
  const [chosen, setChosen] = useState(address);
  const [followed, setFollowed] = useState(address);
  if (address !== followed) {
    setFollowed(address);
    setChosen(address);
  }
  return [chosen, setChosen];
}

function Sheet({ first, address }: { first: Strip; address: SheetAddress }) {
  const navigate = useNavigate();
  const { data: user } = useQuery(sessionQuery);
  const [chosen, setChosen] = useChosen(address);
  const others = useQueries({ queries: chosen.others.map(stripQuery), combine: joinOthers });
  const strips = useMemo(() => [first, ...others.strips], [first, others.strips]);
  const setup = useMemo(
    () => ({ ...pageSetupOf(first.parameters.sheet), ...chosen.chosen }),
    [first.parameters.sheet, chosen.chosen],
  );
  const go = (stripId: string, next: SheetAddress, replace: boolean): void =>
    void navigate(paths.sheet(stripId, writeSheetAddress(next)), { replace, preventScrollReset: true });
  const change = (changes: Partial<SheetAddress>): void => {
    const next = { ...chosen, ...changes };
    setChosen(next);
    go(first.id, next, true);
  };
  const changeSetup = (changes: Partial<PageSetup>): void =>
    change({ chosen: { ...chosen.chosen, ...changes } });
  // What the first strip would decide is written down, so that another first strip changes nothing.
  const changeStrips = ([next, ...rest]: string[]): void =>
    go(next, { ...chosen, others: rest, chosen: setup }, false);
  return (
    <SheetDesigner
      strips={strips}
      fetching={others.fetching}
      missing={others.missing.map(({ words }, i) => ({ id: chosen.others[others.failedAt[i]], words }))}
      unsaved={strips.filter(hasUnsaved).map(({ title }) => title)}
      setup={setup}
      organisation={user?.organisation ?? ''}
      page={chosen.page}
      onSetup={changeSetup}
      onStrips={changeStrips}
      onPage={(page) => change({ page })}
    />
  );
}

function Opening() {
  return (
    <main className="flex grow flex-col">
      <p role="status" className="border-b border-rule px-4 py-4 text-body text-ink-3 tablet:px-6">
        Opening …
      </p>
      <div className="grow bg-sunk p-6">
        <div
          aria-hidden="true"
          className="mx-auto flex aspect-[297/210] w-full max-w-[891px] items-center bg-white px-[6%] shadow-float"
        >
          <span className="grow border-t-2 border-dotted border-edge" />
        </div>
      </div>
    </main>
  );
}

/** The printed sheets of saved strips; all that is chosen for them is kept in the address. */
export function Component() {
  const { stripId = '' } = useParams();
  const [search] = useSearchParams();
  const address = useMemo(() => readSheetAddress(stripId, search), [stripId, search]);
  const { data: strip } = useQuery({ ...stripQuery(stripId), throwOnError: true });
  return strip ? <Sheet first={strip} address={address} /> : <Opening />;
}
