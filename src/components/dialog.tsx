import { Dialog as RadixDialog } from 'radix-ui';
import { useRef, type ReactNode } from 'react';
import { Button } from './button';

interface DialogProps {
  open: boolean;
  title: string;
  description?: string;
  onClose(): void;
  children: ReactNode;
}

/** A dialog of at most 440 px; Escape and a click beside it close it, and the focus goes back to where it was. */
export function Dialog({ open, title, description, onClose, children }: DialogProps) {
  const focusedBefore = useRef<HTMLElement | null>(null);
  return (
    <RadixDialog.Root open={open} onOpenChange={(next) => !next && onClose()}>
      <RadixDialog.Portal>
        <RadixDialog.Overlay className="fixed inset-0 z-40 bg-[rgb(31_42_55/0.28)]" />
        <RadixDialog.Content
          aria-describedby={description ? undefined : ''}
          onOpenAutoFocus={() => {
            focusedBefore.current = document.activeElement as HTMLElement | null;
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            focusedBefore.current?.focus();
          }}
          className="fixed top-1/2 left-1/2 z-50 max-h-[calc(100dvh-2rem)] w-[min(440px,calc(100vw-2rem))] -translate-x-1/2 -translate-y-1/2 overflow-auto rounded-dialog border border-rule-strong bg-sheet p-5 shadow-float"
        >
          <RadixDialog.Title className="text-section font-semibold">{title}</RadixDialog.Title>
          {description && (
            <RadixDialog.Description className="mt-1.5 text-body text-ink-2">
              {description}
            </RadixDialog.Description>
          )}
          {children}
        </RadixDialog.Content>
      </RadixDialog.Portal>
    </RadixDialog.Root>
  );
}

interface ConfirmDialogProps {
  open: boolean;
  title: string;
  description: string;
  /** The safe way out: first and focused. */
  safe: string;
  action: string;
  danger?: boolean;
  onAct(): void;
  onClose(): void;
}

export function ConfirmDialog({
  open,
  title,
  description,
  safe,
  action,
  danger,
  onAct,
  onClose,
}: ConfirmDialogProps) {
  return (
    <Dialog open={open} title={title} description={description} onClose={onClose}>
      <div className="mt-5 flex flex-wrap justify-end gap-2.5">
        <Button onClick={onClose}>{safe}</Button>
        <Button kind={danger ? 'danger' : 'primary'} onClick={onAct}>
          {action}
        </Button>
      </div>
    </Dialog>
  );
}
