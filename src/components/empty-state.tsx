import type { ReactNode } from 'react';

/** Nothing here yet: one sentence and one way on. */
export function EmptyState({ title, text, children }: { title: string; text: string; children?: ReactNode }) {
  return (
    <div className="rounded-control border border-dashed border-edge p-6">
      <p className="text-section font-semibold">{title}</p>
      <p className="mt-1 max-w-prose text-body text-ink-2">{text}</p>
      {children && <div className="mt-4">{children}</div>}
    </div>
  );
}
