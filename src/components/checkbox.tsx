import { useId, type ReactNode } from 'react';

interface CheckboxProps {
  label: ReactNode;
  /** Under the label, smaller. */
  help?: string;
  checked: boolean;
  disabled?: boolean;
  onChange(checked: boolean): void;
}

/** Chosen or not; the label is part of what can be pressed. */
export function Checkbox({ label, help, checked, disabled, onChange }: CheckboxProps) {
  const id = useId();
  return (
    <label className="flex items-start gap-2.5 py-1.5 pointer-coarse:min-h-11 pointer-coarse:py-2.5">
      <input
        type="checkbox"
        checked={checked}
        disabled={disabled}
        aria-describedby={help ? id : undefined}
        onChange={(event) => onChange(event.target.checked)}
        className="mt-0.5 size-4 shrink-0 accent-teal"
      />
      <span className="min-w-0">
        <span className="block text-body font-medium">{label}</span>
        {help && (
          <span id={id} className="block text-caption text-ink-3">
            {help}
          </span>
        )}
      </span>
    </label>
  );
}
