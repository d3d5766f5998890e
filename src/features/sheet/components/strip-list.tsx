import { useRef } from 'react';
import { Link } from 'react-router-dom';
import type { Strip } from '../../../../shared/api/strips';
import { mostSheetStrips } from '../../../../shared/api/sheets';
import { Button } from '../../../components/button';
import { paths } from '../../../lib/paths';

interface StripListProps {
  strips: readonly Strip[];
  /** The ids in their new order. */
  onChange(stripIds: string[]): void;
}

/** The list with one strip moved to another place. */
function moved(ids: readonly string[], from: number, to: number): string[] {
  const rest = ids.filter((_, i) => i !== from);
  return [...rest.slice(0, to), ids[from], ...rest.slice(to)];
}

/** Stays where it is when there is nowhere to go, so that the focus does too. */
function MoveButton({ word, title, to }: { word: string; title: string; to: (() => void) | null }) {
  return (
    <Button
      small
      kind="quiet"
      aria-label={`${word}: ${title}`}
      aria-disabled={to === null}
      onClick={to ?? undefined}
      className="aria-disabled:text-ink-3"
    >
      {word}
    </Button>
  );
}

/** The strips in the order of their pages: to move, take off and open. */
export function StripList({ strips, onChange }: StripListProps) {
  const ids = strips.map(({ id }) => id);
  const list = useRef<HTMLElement>(null);
  const takeOff = (id: string): void => {
    // The button goes with its strip; the focus stays with the list.
    list.current?.focus();
    onChange(ids.filter((one) => one !== id));
  };
  return (
    <section ref={list} tabIndex={-1} aria-label="Strips" className="flex flex-col gap-2">
      <h2 className="flex items-baseline justify-between text-body font-semibold">
        Strips
        <span className="text-caption font-normal text-ink-3">
          {strips.length} of at most {mostSheetStrips}
        </span>
      </h2>
      <ol className="border-t border-rule">
        {strips.map(({ id, title }, i) => (
          <li key={id} className="border-b border-rule py-1.5">
            <span className="flex gap-2 text-body">
              <span className="font-mono text-dense text-ink-3">{i + 1}</span>
              <Link to={paths.strip(id)} className="min-w-0 break-words hover:underline">
                {title}
              </Link>
            </span>
            {strips.length > 1 && (
              <span className="-mb-0.5 -ml-2.5 flex">
                <MoveButton
                  word="Up"
                  title={title}
                  to={i > 0 ? () => onChange(moved(ids, i, i - 1)) : null}
                />
                <MoveButton
                  word="Down"
                  title={title}
                  to={i < ids.length - 1 ? () => onChange(moved(ids, i, i + 1)) : null}
                />
                <Button small kind="quiet" aria-label={`Take off: ${title}`} onClick={() => takeOff(id)}>
                  Take off
                </Button>
              </span>
            )}
          </li>
        ))}
      </ol>
    </section>
  );
}
