import type { ButtonHTMLAttributes } from 'react';
import { classNames } from '../lib/class-names';

export type ButtonKind = 'primary' | 'plain' | 'quiet' | 'danger';

const kinds: Record<ButtonKind, string> = {
  primary: 'border-teal bg-teal text-white hover:bg-teal-dark',
  plain: 'border-edge bg-sheet text-ink hover:bg-sunk',
  quiet: 'border-transparent text-teal-dark hover:bg-teal-tint',
  danger: 'border-red bg-sheet text-red hover:bg-red-tint',
};

/** Look of a button, also for links that act like one. */
export function buttonClass(kind: ButtonKind, small = false): string {
  return classNames(
    'inline-flex shrink-0 items-center justify-center gap-2 rounded-control border font-medium whitespace-nowrap',
    'transition-colors duration-100 pointer-coarse:min-h-11',
    'disabled:border-dashed disabled:border-edge disabled:bg-transparent disabled:text-ink-3',
    small ? 'h-7 px-2.5 text-dense' : 'h-[34px] px-3.5 text-body',
    kinds[kind],
  );
}

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  kind?: ButtonKind;
  small?: boolean;
}

export function Button({ kind = 'plain', small, className, type = 'button', ...rest }: ButtonProps) {
  return <button type={type} className={classNames(buttonClass(kind, small), className)} {...rest} />;
}
