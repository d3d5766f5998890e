import { Notice } from '../../../components/notice';

/** More notes than these are shown on request. */
const mostShown = 3;

function Sentences({ notes }: { notes: readonly string[] }) {
  return (
    <ul className="mt-1 flex flex-col gap-0.5">
      {notes.map((note) => (
        <li key={note}>{note}</li>
      ))}
    </ul>
  );
}

/** What was shortened, wrapped or cut on the pages, in words. */
export function DocumentNotes({ notes }: { notes: readonly string[] }) {
  if (notes.length === 0) return null;
  const more = notes.slice(mostShown);
  return (
    <Notice kind="amber" title="Nothing is scaled to fit the paper, so:">
      <Sentences notes={notes.slice(0, mostShown)} />
      {more.length > 0 && (
        <details className="mt-1">
          <summary className="cursor-pointer font-medium">
            {more.length === 1 ? 'One more' : `${more.length} more`}
          </summary>
          <Sentences notes={more} />
        </details>
      )}
    </Notice>
  );
}
