import { DropdownMenu } from 'radix-ui';
import type { ReactNode } from 'react';

/** A list of actions behind a button. */
export function Menu({
  label,
  trigger,
  children,
}: {
  label: string;
  trigger: ReactNode;
  children: ReactNode;
}) {
  return (
    <DropdownMenu.Root>
      <DropdownMenu.Trigger
        aria-label={label}
        className="inline-flex items-center justify-center rounded-control pointer-coarse:min-h-11 pointer-coarse:min-w-11"
      >
        {trigger}
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align="end"
          sideOffset={6}
          className="z-50 min-w-44 rounded-dialog border border-rule-strong bg-sheet p-1 shadow-float"
        >
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

export function MenuItem({ onSelect, children }: { onSelect(): void; children: ReactNode }) {
  return (
    <DropdownMenu.Item
      onSelect={onSelect}
      className="cursor-default rounded-chip px-2.5 py-1.5 text-body outline-none select-none data-highlighted:bg-teal-tint pointer-coarse:py-3"
    >
      {children}
    </DropdownMenu.Item>
  );
}

export function MenuLabel({ children }: { children: ReactNode }) {
  return (
    <DropdownMenu.Label className="border-b border-rule px-2.5 pt-1 pb-2 text-body">
      {children}
    </DropdownMenu.Label>
  );
}
