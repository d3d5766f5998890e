import { useEffect, useRef, useState } from 'react';
import { pageSetupSchema } from '../../../../shared/parameters/page-setup';
import { fieldMeta } from '../../../../shared/parameters/allowed';
import { TextField } from '../../../components/text-field';

/** Typing rests this long before the page follows. */
const restMs = 300;

const meta = fieldMeta(pageSetupSchema.unwrap().shape.cohort);
const maxLength = meta?.kind === 'text' ? meta.maxLength : undefined;

/** The cohort's name; the page follows once typing rests. */
export function CohortField({ value, onChange }: { value: string; onChange(cohort: string): void }) {
  const [typed, setTyped] = useState(value);
  const [lastValue, setLastValue] = useState(value);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  if (value !== lastValue) {
    setLastValue(value);
    setTyped(value);
  }
  useEffect(() => () => clearTimeout(timer.current ?? undefined), []);
  return (
    <TextField
      label="Cohort"
      help="Printed under the title; empty prints none."
      autoComplete="off"
      maxLength={maxLength}
      value={typed}
      onChange={(event) => {
        const words = event.target.value;
        setTyped(words);
        clearTimeout(timer.current ?? undefined);
        timer.current = setTimeout(() => onChange(words), restMs);
      }}
    />
  );
}
