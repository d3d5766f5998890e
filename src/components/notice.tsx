import type { ReactNode } from 'react';
import { classNames } from '../lib/class-names';

const kinds = {
  teal: 'border-l-teal bg-teal-tint text-teal-dark',
  amber: 'border-l-amber bg-amber-tint text-amber-ink',
  red: 'border-l-red bg-red-tint text-red-ink',
} as const;

interface NoticeProps {
  kind: keyof typeof kinds;
  /** First sentence, in bold. */
  title: string;
  children?: ReactNode;
}

/** Something to know, with a bar at its left. */
export function Notice({ kind, title, children }: NoticeProps) {
  return (
    <div
      role={kind === 'red' ? 'alert' : 'status'}
      className={classNames('border-l-[3px] px-3.5 py-2.5 text-dense', kinds[kind])}
    >
      <strong className="font-semibold">{title}</strong> {children}
    </div>
  );
}
