import { useId, useState, type KeyboardEvent } from 'react';
import { classNames } from '../lib/class-names';
import { FieldError } from './field-frame';
import { Ruler } from './ruler';

type Parsed = { value: number } | { error: string };

export interface NumberFieldProps {
  label: string;
  unit: string;
  /** null: decided elsewhere; only with `nullable`. */
  value: number | null;
  min: number;
  max: number;
  integer?: boolean;
  usual?: readonly [number, number];
  help?: string;
  nullable?: boolean;
  /** What an empty field means. */
  emptyWords?: string;
  marker?: { value: number; label: string };
  /** Why the last change was refused, when the field itself allowed it. */
  error?: string;
  parse(text: string): Promise<Parsed>;
  /** Every change, also while dragging. */
  onChange(value: number | null): void;
  /** The change is done: release, Enter, leaving the field. */
  onCommit(): void;
}

/** Rulers move in steps that people would choose: about a two-hundredth of the range, rounded to 1, 2 or 5. */
export function rulerStep(min: number, max: number, integer = false): number {
  const wanted = (max - min) / 200;
  const power = 10 ** Math.floor(Math.log10(wanted));
  const step = [1, 2, 5, 10].map((factor) => factor * power).find((one) => one >= wanted) ?? wanted;
  return integer ? Math.max(1, Math.round(step)) : step;
}

/** A number as it stands in a field: no more decimals than it needs. */
export function showNumber(value: number): string {
  return String(Number(value.toPrecision(6)));
}

function rangeError(
  value: number,
  { min, max, unit, integer, value: shown }: NumberFieldProps,
): string | null {
  const withUnit = (one: number): string => `${showNumber(one)}${unit ? ` ${unit}` : ''}`;
  const still = shown === null ? '' : ` The strip still shows ${withUnit(shown)}.`;
  if (value > max) return `${withUnit(value)} is above ${withUnit(max)}, the most allowed.${still}`;
  if (value < min) return `${withUnit(value)} is below ${withUnit(min)}, the least allowed.${still}`;
  if (integer && !Number.isInteger(value)) return `${withUnit(value)} is not a whole number.${still}`;
  return null;
}

/** Words for an empty field up to this length fit into a field of the usual width. */
const shortWords = 9;

/** Where the words for the usual range stand: under their band, but clear of the ruler's ends. */
function usualAt([from, to]: readonly [number, number], min: number, max: number): string {
  const middle = (100 * ((from + to) / 2 - min)) / (max - min);
  return `${Math.max(26, Math.min(74, middle)).toFixed(1)}%`;
}

/** Label, typed value with its unit, ruler with the usual range, help and errors in words. */
export function NumberField(props: NumberFieldProps) {
  const { label, unit, value, min, max, integer, usual, help, nullable, emptyWords, marker, parse } = props;
  const id = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const [typedError, setTypedError] = useState<string | null>(null);
  const error = typedError ?? props.error ?? null;
  const shown = typed ?? (value === null ? '' : showNumber(value));

  const accept = async (text: string): Promise<void> => {
    if (text.trim() === '' && nullable) {
      setTyped(null);
      setTypedError(null);
      props.onChange(null);
      props.onCommit();
      return;
    }
    const parsed = await parse(text);
    const problem = 'error' in parsed ? parsed.error : rangeError(parsed.value, props);
    setTypedError(problem);
    if (problem !== null || 'error' in parsed) return;
    setTyped(null);
    props.onChange(parsed.value);
    props.onCommit();
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>): void => {
    if (event.key === 'Enter') void accept(shown);
    if (event.key === 'Escape') {
      setTyped(null);
      setTypedError(null);
    }
  };

  return (
    <div className="min-w-0">
      <div className="flex items-center justify-between gap-3">
        <label htmlFor={id} className="text-body font-medium">
          {label}
        </label>
        <span
          className={classNames(
            'flex h-[30px] items-center rounded-chip border bg-sheet pr-2 pointer-coarse:h-11',
            error ? 'border-red' : 'border-edge',
          )}
        >
          <input
            id={id}
            inputMode="decimal"
            autoComplete="off"
            value={shown}
            placeholder={value === null ? emptyWords : undefined}
            aria-invalid={error !== null}
            aria-describedby={`${id}-help ${id}-error`}
            onChange={(event) => setTyped(event.target.value)}
            onBlur={() => typed !== null && void accept(typed)}
            onKeyDown={onKeyDown}
            className={classNames(
              'h-full rounded-chip bg-transparent pr-1 pl-2 text-right font-mono text-body placeholder:font-sans placeholder:text-dense placeholder:text-ink-3',
              value === null && typed === null && (emptyWords?.length ?? 0) > shortWords ? 'w-44' : 'w-20',
            )}
          />
          {unit && <span className="text-dense text-ink-3">{unit}</span>}
        </span>
      </div>
      {error !== null && <FieldError id={`${id}-error`}>{error}</FieldError>}
      <Ruler
        label={`${label}, ruler`}
        value={value ?? (usual ? (usual[0] + usual[1]) / 2 : min)}
        min={min}
        max={max}
        step={rulerStep(min, max, integer)}
        usual={usual}
        markerAt={marker?.value}
        describedBy={`${id}-help`}
        onChange={(next) => {
          setTyped(null);
          setTypedError(null);
          props.onChange(next);
        }}
        onCommit={props.onCommit}
      />
      <div className="relative flex justify-between text-caption text-ink-3">
        <span>{showNumber(min)}</span>
        {usual && (
          <span
            className="absolute -translate-x-1/2 bg-paper px-1"
            style={{ left: usualAt(usual, min, max) }}
          >
            usual {showNumber(usual[0])}–{showNumber(usual[1])}
          </span>
        )}
        <span>{showNumber(max)}</span>
      </div>
      <p id={`${id}-help`} className="text-caption text-ink-3">
        {help}
        {marker && ` ${marker.label}`}
      </p>
    </div>
  );
}
