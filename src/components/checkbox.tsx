interface CheckboxProps {
  label: string;
  checked: boolean;
  onChange(checked: boolean): void;
}

/** On or off, with its words beside it. */
export function Checkbox({ label, checked, onChange }: CheckboxProps) {
  return (
    <label className="flex items-center gap-2.5 text-body pointer-coarse:min-h-11">
      <input
        type="checkbox"
        checked={checked}
        onChange={(event) => onChange(event.target.checked)}
        className="size-4 shrink-0 accent-teal"
      />
      {label}
    </label>
  );
}
