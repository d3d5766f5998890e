import { Select } from 'radix-ui';
import { classNames } from '../lib/class-names';
import { styleNonce } from '../lib/style-nonce';
import type { Option } from './segments';

interface SelectFieldProps<T extends string> {
  label: string;
  value: T;
  options: readonly Option<NoInfer<T>>[];
  onChange(value: NoInfer<T>): void;
  small?: boolean;
}

/** One of many, in a list that opens. */
export function SelectField<T extends string>({
  label,
  value,
  options,
  onChange,
  small,
}: SelectFieldProps<T>) {
  return (
    <Select.Root value={value} onValueChange={(next) => onChange(next as T)}>
      <Select.Trigger
        aria-label={label}
        className={classNames(
          'inline-flex max-w-full items-center justify-between gap-2 rounded-control border border-edge bg-sheet whitespace-nowrap hover:bg-sunk pointer-coarse:min-h-11',
          small ? 'h-7 px-2.5 text-dense' : 'h-8 min-w-40 px-3 text-body',
        )}
      >
        <Select.Value />
        <Select.Icon aria-hidden="true" className="text-ink-3">
          <Chevron />
        </Select.Icon>
      </Select.Trigger>
      <Select.Portal>
        <Select.Content
          position="popper"
          sideOffset={4}
          className="z-50 max-h-80 min-w-(--radix-select-trigger-width) overflow-auto rounded-dialog border border-rule-strong bg-sheet p-1 shadow-float"
        >
          <Select.Viewport nonce={styleNonce()}>
            {options.map((option) => (
              <Select.Item
                key={option.value}
                value={option.value}
                className={classNames(
                  'cursor-default rounded-chip px-2.5 py-1.5 text-body outline-none select-none pointer-coarse:py-3',
                  'data-highlighted:bg-teal-tint data-[state=checked]:font-medium',
                )}
              >
                <Select.ItemText>{option.label}</Select.ItemText>
              </Select.Item>
            ))}
          </Select.Viewport>
        </Select.Content>
      </Select.Portal>
    </Select.Root>
  );
}

export function Chevron() {
  return (
    <svg viewBox="0 0 12 12" className="size-3" fill="none" stroke="currentColor" strokeWidth="1.6">
      <path d="M2.5 4.5 6 8l3.5-3.5" />
    </svg>
  );
}
