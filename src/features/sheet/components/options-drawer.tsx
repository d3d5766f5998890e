import { Dialog as RadixDialog } from 'radix-ui';
import type { ReactNode } from 'react';
import { buttonClass } from '../../../components/button';

/** The options of a narrow screen, behind a button. */
export function OptionsDrawer({ children }: { children: ReactNode }) {
  return (
    <RadixDialog.Root>
      <RadixDialog.Trigger className={buttonClass('plain')}>Options</RadixDialog.Trigger>
      <RadixDialog.Portal>
        <RadixDialog.Overlay className="fixed inset-0 z-40 bg-[rgb(31_42_55/0.28)]" />
        <RadixDialog.Content
          aria-describedby=""
          className="fixed inset-y-0 right-0 z-50 w-80 max-w-[88vw] overflow-auto bg-paper p-5 shadow-float"
        >
          <div className="mb-4 flex items-center justify-between">
            <RadixDialog.Title className="text-section font-semibold">Options</RadixDialog.Title>
            <RadixDialog.Close className={buttonClass('quiet', true)}>Done</RadixDialog.Close>
          </div>
          {children}
        </RadixDialog.Content>
      </RadixDialog.Portal>
    </RadixDialog.Root>
  );
}
