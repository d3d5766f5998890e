import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { stripListQuery } from '../../../api/strips';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { Notice } from '../../../components/notice';
import { SearchBox } from '../../../components/search-box';

interface AddStripDialogProps {
  /** Those on the sheets already. */
  taken: readonly string[];
  onAdd(stripId: string): void;
  onClose(): void;
}

/** As many as one looks through; more are found by a word of the title. */
const mostFound = 30;

/** Picks a strip of the library by search. */
export function AddStripDialog({ taken, onAdd, onClose }: AddStripDialogProps) {
  const [words, setWords] = useState('');
  const { data, error, refetch } = useQuery(
    stripListQuery({ search: words, sort: words === '' ? 'updated' : 'course', pageSize: mostFound }),
  );
  const found = data?.strips.filter(({ id }) => !taken.includes(id)) ?? [];
  return (
    <Dialog
      open
      title="Add a strip"
      description="It comes after the others, on the same page where it fits."
      onClose={onClose}
    >
      <div className="mt-4 flex flex-col gap-3">
        <SearchBox
          wide
          label="Search the library"
          placeholder="Title, tag or teaching point"
          value={words}
          onSearch={setWords}
        />
        {error && (
          <div className="flex flex-wrap items-center gap-3">
            <Notice kind="red" title="The strips could not be listed.">
              {error.message}
            </Notice>
            <Button small onClick={() => void refetch()}>
              Try again
            </Button>
          </div>
        )}
        {!data && !error && <p className="text-body text-ink-3">Looking for strips …</p>}
        {data && found.length === 0 && (
          <p className="text-body text-ink-2">
            {words === '' ? 'Every strip is on the sheets already.' : 'No other strip has these words.'}
          </p>
        )}
        <ul
          aria-label="Strips found"
          className="max-h-[46dvh] overflow-y-auto border-y border-rule empty:hidden"
        >
          {found.map(({ id, title, teachingPoint }) => (
            <li key={id} className="border-b border-rule last:border-b-0">
              <button
                type="button"
                onClick={() => onAdd(id)}
                className="block w-full px-2 py-2 text-left hover:bg-teal-tint focus-visible:-outline-offset-2"
              >
                <span className="block text-body font-medium break-words">{title}</span>
                <span className="line-clamp-1 text-caption text-ink-3">{teachingPoint}</span>
              </button>
            </li>
          ))}
        </ul>
        {data && data.total > data.strips.length && (
          <p className="text-caption text-ink-3">
            {data.strips.length} of {data.total} shown; type a word to find the others.
          </p>
        )}
        <div className="flex justify-end">
          <Button onClick={onClose}>Close</Button>
        </div>
      </div>
    </Dialog>
  );
}
