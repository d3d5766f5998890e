import type { ReactNode } from 'react';
import { classNames } from '../lib/class-names';

/** A word in a box; a button when it can be chosen. */
export function Tag({
  children,
  chosen,
  onClick,
}: {
  children: ReactNode;
  chosen?: boolean;
  onClick?: () => void;
}) {
  const look = classNames(
    'inline-flex items-center rounded-chip border px-2 text-caption whitespace-nowrap',
    chosen ? 'border-teal bg-teal text-white' : 'border-rule-strong text-ink-2',
  );
  if (!onClick) return <span className={classNames(look, 'h-5')}>{children}</span>;
  return (
    <button
      type="button"
      aria-pressed={chosen}
      onClick={onClick}
      className={classNames(look, 'h-6 pointer-coarse:min-h-11', !chosen && 'hover:bg-sunk')}
    >
      {children}
    </button>
  );
}

interface BeatChipProps {
  children: ReactNode;
  label: string;
  chosen: boolean;
  onClick(): void;
}

/** A beat's number, or a range of them, in a bordered square. */
export function BeatChip({ children, label, chosen, onClick }: BeatChipProps) {
  return (
    <button
      type="button"
      aria-label={label}
      aria-pressed={chosen}
      onClick={onClick}
      className={classNames(
        'inline-flex h-5.5 min-w-5.5 items-center justify-center rounded-chip border px-1.5 font-mono text-caption font-medium',
        chosen ? 'border-teal bg-teal text-white' : 'border-edge bg-sheet text-ink hover:bg-sunk',
      )}
    >
      {children}
    </button>
  );
}
