import { useEffect, useRef, useState } from 'react';
import { classNames } from '../lib/class-names';

/** Typing rests this long before the list follows. */
const restMs = 250;

interface SearchBoxProps {
  label: string;
  placeholder: string;
  value: string;
  /** As wide as there is room. */
  wide?: boolean;
  onSearch(words: string): void;
}

/** A search that follows what is typed, and what the address says. */
export function SearchBox({ label, placeholder, value, wide, onSearch }: SearchBoxProps) {
  const [typed, setTyped] = useState(value);
  const [lastValue, setLastValue] = useState(value);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  if (value !== lastValue) {
    setLastValue(value);
    if (value !== typed.trim()) setTyped(value);
  }
  useEffect(() => () => clearTimeout(timer.current ?? undefined), []);
  return (
    <div className={classNames('relative min-w-44 grow', !wide && 'tablet:max-w-80')}>
      <svg
        viewBox="0 0 16 16"
        className="pointer-events-none absolute top-1/2 left-3 size-4 -translate-y-1/2 text-ink-3"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.6"
        aria-hidden="true"
      >
        <circle cx="7" cy="7" r="4.5" />
        <path d="m10.5 10.5 3.5 3.5" />
      </svg>
      <input
        type="search"
        aria-label={label}
        placeholder={placeholder}
        value={typed}
        maxLength={200}
        onChange={(event) => {
          const words = event.target.value;
          setTyped(words);
          clearTimeout(timer.current ?? undefined);
          timer.current = setTimeout(() => onSearch(words.trim()), restMs);
        }}
        className="h-[34px] w-full rounded-control border border-edge bg-sheet pr-3 pl-9 text-body placeholder:text-ink-3 pointer-coarse:h-11"
      />
    </div>
  );
}
