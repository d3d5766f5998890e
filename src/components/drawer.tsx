import { Dialog as RadixDialog } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from '../lib/class-names';
import { buttonClass } from './button';

interface DrawerProps {
  /** On the button and over the contents. */
  title: string;
  side: 'left' | 'right';
  /** Of the button. */
  className?: string;
  children: ReactNode;
}

/** What a narrow screen has no room for, behind a button. */
export function Drawer({ title, side, className, children }: DrawerProps) {
  return (
    <RadixDialog.Root>
      <RadixDialog.Trigger className={classNames(buttonClass('plain'), className)}>
        {title}
      </RadixDialog.Trigger>
      <RadixDialog.Portal>
        <RadixDialog.Overlay className="fixed inset-0 z-40 bg-[rgb(31_42_55/0.28)]" />
        <RadixDialog.Content
          aria-describedby=""
          className={classNames(
            'fixed inset-y-0 z-50 w-80 max-w-[85vw] overflow-auto bg-paper p-5 shadow-float',
            side === 'left' ? 'left-0' : 'right-0',
          )}
        >
          <div className="mb-4 flex items-center justify-between">
            <RadixDialog.Title className="text-section font-semibold">{title}</RadixDialog.Title>
            <RadixDialog.Close className={buttonClass('quiet', true)}>Done</RadixDialog.Close>
          </div>
          {children}
        </RadixDialog.Content>
      </RadixDialog.Portal>
    </RadixDialog.Root>
  );
}
