import { Tabs as RadixTabs } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from '../lib/class-names';
import type { Option } from './segments';

interface TabsProps<T extends string> {
  label: string;
  value: T;
  options: readonly Option<NoInfer<T>>[];
  onChange(value: NoInfer<T>): void;
  accent?: 'teal' | 'copper';
  children: ReactNode;
}

/** Tabs with a 3 px underline; the page below belongs to the chosen one. */
export function Tabs<T extends string>({
  label,
  value,
  options,
  onChange,
  accent = 'teal',
  children,
}: TabsProps<T>) {
  return (
    <RadixTabs.Root value={value} onValueChange={(next) => onChange(next as T)}>
      <RadixTabs.List aria-label={label} className="flex gap-6 overflow-x-auto border-b border-rule">
        {options.map((option) => (
          <RadixTabs.Trigger
            key={option.value}
            value={option.value}
            className={classNames(
              'border-b-[3px] border-transparent pb-1.5 text-body whitespace-nowrap text-ink-2 hover:text-ink pointer-coarse:min-h-11 focus-visible:-outline-offset-2',
              'data-[state=active]:font-semibold data-[state=active]:text-ink',
              accent === 'copper'
                ? 'data-[state=active]:border-b-copper'
                : 'data-[state=active]:border-b-teal',
            )}
          >
            {option.label}
          </RadixTabs.Trigger>
        ))}
      </RadixTabs.List>
      <RadixTabs.Content value={value}>{children}</RadixTabs.Content>
    </RadixTabs.Root>
  );
}
