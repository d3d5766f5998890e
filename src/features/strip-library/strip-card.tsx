import { Link } from 'react-router-dom';
import type { Strip } from '../../../shared/api/strips';
import { Tag } from '../../components/chip';
import { Menu, MenuItem } from '../../components/menu';
import { paths } from '../../lib/paths';
import { Miniature } from './miniature';
import { pacingWords } from './strip-words';

export interface StripActions {
  onOpen(strip: Strip): void;
  onSheet(strip: Strip): void;
  onDuplicate(strip: Strip): void;
  onSavePreset(strip: Strip): void;
  onDelete(strip: Strip): void;
}

export function StripMenu({ strip, actions }: { strip: Strip; actions: StripActions }) {
  return (
    <Menu
      label={`Actions for ${strip.title}`}
      trigger={
        <span className="grid size-7 place-items-center rounded-control text-ink-2 hover:bg-sunk">⋯</span>
      }
    >
      <MenuItem onSelect={() => actions.onOpen(strip)}>Open</MenuItem>
      <MenuItem onSelect={() => actions.onSheet(strip)}>Sheet to print</MenuItem>
      <MenuItem onSelect={() => actions.onDuplicate(strip)}>Duplicate</MenuItem>
      <MenuItem onSelect={() => actions.onSavePreset(strip)}>Save as preset file</MenuItem>
      {strip.canDelete && <MenuItem onSelect={() => actions.onDelete(strip)}>Delete</MenuItem>}
    </Menu>
  );
}

/** A strip as a card: miniature to the edges, stimulus line, title, teaching point, mode and tags. */
export function StripCard({ strip, actions }: { strip: Strip; actions: StripActions }) {
  return (
    <article className="relative flex flex-col overflow-hidden rounded-control border border-edge bg-sheet focus-within:outline-2 focus-within:outline-offset-2 focus-within:outline-teal hover:border-ink-2">
      <Miniature parameters={strip.parameters} />
      <div className="flex grow flex-col border-t border-rule px-3 py-2.5">
        <div className="flex items-start justify-between gap-2">
          <h3 className="min-w-0 text-body font-semibold break-words">
            <Link to={paths.strip(strip.id)} className="outline-none after:absolute after:inset-0">
              {strip.title}
            </Link>
          </h3>
          <span className="relative z-10 -mt-1 -mr-1.5">
            <StripMenu strip={strip} actions={actions} />
          </span>
        </div>
        <p className="line-clamp-2 text-dense text-ink-2">{strip.teachingPoint}</p>
        <div className="mt-auto flex items-end justify-between gap-3 pt-2.5">
          <span className="shrink-0 text-caption text-ink-3">{pacingWords(strip.parameters)}</span>
          <span className="flex min-w-0 flex-wrap justify-end gap-1">
            {strip.tags.slice(0, 2).map((tag) => (
              <Tag key={tag}>{tag}</Tag>
            ))}
          </span>
        </div>
      </div>
    </article>
  );
}
