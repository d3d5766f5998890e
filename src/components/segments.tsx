import { RadioGroup } from 'radix-ui';
import { classNames } from '../lib/class-names';

export interface Option<T extends string> {
  value: T;
  label: string;
}

interface SegmentsProps<T extends string> {
  label: string;
  value: T;
  options: readonly Option<NoInfer<T>>[];
  onChange(value: NoInfer<T>): void;
  small?: boolean;
  /** As wide as there is room, in equal parts. */
  stretched?: boolean;
}

/** One of a few, side by side; arrow keys walk them. */
export function Segments<T extends string>({
  label,
  value,
  options,
  onChange,
  small,
  stretched,
}: SegmentsProps<T>) {
  return (
    <RadioGroup.Root
      aria-label={label}
      orientation="horizontal"
      value={value}
      onValueChange={(next) => onChange(next as T)}
      className={classNames(
        'max-w-full divide-x divide-edge overflow-x-auto rounded-control border border-edge bg-sheet',
        stretched ? 'flex' : 'inline-flex',
      )}
    >
      {options.map((option) => (
        <RadioGroup.Item
          key={option.value}
          value={option.value}
          className={classNames(
            'px-3 whitespace-nowrap pointer-coarse:min-h-11 focus-visible:-outline-offset-2',
            small ? 'h-7 text-dense' : 'h-8 text-body',
            stretched && 'grow basis-0',
            option.value === value ? 'bg-ink font-medium text-white' : 'text-ink-2 hover:bg-sunk',
          )}
        >
          {option.label}
        </RadioGroup.Item>
      ))}
    </RadioGroup.Root>
  );
}
