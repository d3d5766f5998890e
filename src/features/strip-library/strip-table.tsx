import { Link } from 'react-router-dom';
import type { Strip } from '../../../shared/api/strips';
import type { StripSort } from '../../../shared/api/strip-list';
import { paths } from '../../lib/paths';
import { StripMenu, type StripActions } from './strip-card';
import { pacingWords } from './strip-words';

interface StripTableProps {
  strips: readonly Strip[];
  sort: StripSort;
  direction: 'ascending' | 'descending';
  onSort(sort: StripSort): void;
  actions: StripActions;
}

const keeperWords = { me: 'Me', department: 'Department', gallery: 'Shipped gallery' } as const;
const dateFormat = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });

function SortHead({
  label,
  by,
  ...props
}: { label: string; by: StripSort } & Omit<StripTableProps, 'strips' | 'actions'>) {
  const active = props.sort === by;
  return (
    <th scope="col" aria-sort={active ? props.direction : 'none'} className="py-2 pr-4 font-medium">
      <button
        type="button"
        className="font-medium hover:text-ink pointer-coarse:min-h-11"
        onClick={() => props.onSort(by)}
      >
        {label} <span aria-hidden="true">{active ? (props.direction === 'ascending' ? '↑' : '↓') : ''}</span>
      </button>
    </th>
  );
}

/** The library as a table; heads sort. */
export function StripTable({ strips, actions, ...sorting }: StripTableProps) {
  return (
    <div className="relative overflow-x-auto">
      <table className="w-full min-w-160 border-collapse text-left text-body">
        <thead className="border-b border-edge text-caption text-ink-2">
          <tr>
            <SortHead label="Strip" by="title" {...sorting} />
            <th scope="col" className="py-2 pr-4 font-medium">
              Pacing
            </th>
            <th scope="col" className="py-2 pr-4 font-medium">
              Tags
            </th>
            <th scope="col" className="py-2 pr-4 font-medium">
              Kept by
            </th>
            <SortHead label="Changed" by="updated" {...sorting} />
            <th scope="col" className="w-10">
              <span className="sr-only">Actions</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {strips.map((strip) => (
            <tr key={strip.id} className="border-b border-rule hover:bg-sheet">
              <td className="py-2 pr-4">
                <Link to={paths.strip(strip.id)} className="font-medium hover:underline">
                  {strip.title}
                </Link>
                <span className="block max-w-md truncate text-caption text-ink-3">{strip.teachingPoint}</span>
              </td>
              <td className="py-2 pr-4 font-mono text-dense whitespace-nowrap">
                {pacingWords(strip.parameters)}
              </td>
              <td className="py-2 pr-4 text-dense text-ink-2">{strip.tags.join(', ')}</td>
              <td className="py-2 pr-4 text-dense whitespace-nowrap">
                {strip.keptBy === 'department'
                  ? (strip.owner?.name ?? keeperWords.department)
                  : keeperWords[strip.keptBy]}
              </td>
              <td className="py-2 pr-4 font-mono text-dense whitespace-nowrap">
                {dateFormat.format(new Date(strip.updatedAt))}
              </td>
              <td className="py-2 text-right">
                <StripMenu strip={strip} actions={actions} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
