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

/** The strips in the order of their pages: to move, take off and open. */
export function StripList({ strips, onChange }: StripListProps) {
  const ids = strips.map(({ id }) => id);
  return (
    <section aria-label="Strips" className="flex flex-col gap-2">
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
                {i > 0 && (
                  <Button
                    small
                    kind="quiet"
                    aria-label={`Up: ${title}`}
                    onClick={() => onChange(moved(ids, i, i - 1))}
                  >
                    Up
                  </Button>
                )}
                {i < strips.length - 1 && (
                  <Button
                    small
                    kind="quiet"
                    aria-label={`Down: ${title}`}
                    onClick={() => onChange(moved(ids, i, i + 1))}
                  >
                    Down
                  </Button>
                )}
                <Button
                  small
                  kind="quiet"
                  aria-label={`Take off: ${title}`}
                  onClick={() => onChange(ids.filter((one) => one !== id))}
                >
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
