import type { ReactNode } from 'react';
import type { StripFacets, StripListQuery } from '../../../shared/api/strip-list';
import { Tag } from '../../components/chip';
import { classNames } from '../../lib/class-names';

interface FiltersProps {
  query: StripListQuery;
  facets: StripFacets | null;
  onChange(change: Record<string, string | string[] | null>): void;
}

const keepers = [
  { value: 'everyone', label: 'Everyone' },
  { value: 'me', label: 'Me' },
  { value: 'department', label: 'Department' },
  { value: 'gallery', label: 'Shipped gallery' },
] as const;

function FilterRow({
  chosen,
  count,
  onClick,
  children,
}: {
  chosen: boolean;
  count: number;
  onClick(): void;
  children: ReactNode;
}) {
  return (
    <li>
      <button
        type="button"
        aria-pressed={chosen}
        onClick={onClick}
        className={classNames(
          'flex w-full items-baseline justify-between gap-2 border-l-[3px] py-[3px] pl-2.5 text-left text-body pointer-coarse:min-h-11',
          chosen ? 'border-l-teal font-semibold' : 'border-l-transparent text-ink hover:bg-sunk',
        )}
      >
        <span>{children}</span>
        <span className="font-mono text-caption font-normal text-ink-3">{count}</span>
      </button>
    </li>
  );
}

function FilterGroup({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section aria-label={title} className="mb-6">
      <h2 className="mb-1.5 text-dense font-medium text-ink-2">{title}</h2>
      {children}
    </section>
  );
}

/** Whose strips, which part of the course, which tags; each with the count it would leave. */
export function Filters({ query, facets, onChange }: FiltersProps) {
  const toggleTag = (tag: string): void =>
    onChange({ tag: query.tag.includes(tag) ? query.tag.filter((one) => one !== tag) : [...query.tag, tag] });
  return (
    <div>
      <FilterGroup title="Kept by">
        <ul>
          {keepers.map(({ value, label }) => (
            <FilterRow
              key={value}
              chosen={query.keptBy === value}
              count={facets?.keptBy[value] ?? 0}
              onClick={() => onChange({ keptBy: value === 'everyone' ? null : value })}
            >
              {label}
            </FilterRow>
          ))}
        </ul>
      </FilterGroup>
      <FilterGroup title="Course">
        <ul>
          {facets?.groups.map((group) => (
            <FilterRow
              key={group.id}
              chosen={query.group === group.id}
              count={group.count}
              onClick={() => onChange({ group: query.group === group.id ? null : group.id })}
            >
              {group.title}
            </FilterRow>
          ))}
        </ul>
      </FilterGroup>
      <FilterGroup title="Tags">
        <div className="flex flex-wrap gap-1.5">
          {facets?.tags.slice(0, 18).map(({ tag }) => (
            <Tag key={tag} chosen={query.tag.includes(tag)} onClick={() => toggleTag(tag)}>
              {tag}
            </Tag>
          ))}
        </div>
      </FilterGroup>
    </div>
  );
}
