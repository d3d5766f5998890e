import { readFileSync } from 'node:fs';

interface WorkedExample {
  id: string;
  inputs: unknown;
  value: unknown;
}

const { cases } = JSON.parse(
  readFileSync(new URL('../fixtures/worked-examples.json', import.meta.url), 'utf8'),
) as { cases: WorkedExample[] };

/** Inputs and value of a computed case (tests/fixtures/worked-examples.json), in the shape that the caller expects. */
export function workedExample<Inputs, Value>(id: string): { inputs: Inputs; value: Value } {
  const found = cases.find((one) => one.id === id);
  if (!found) throw new Error(`no worked example ${id}`);
  return { inputs: found.inputs as Inputs, value: found.value as Value };
}

const { entries } = JSON.parse(
  readFileSync(new URL('../fixtures/formats.json', import.meta.url), 'utf8'),
) as { entries: { id: string; value: unknown }[] };

/** The value of a fact about file formats (tests/fixtures/formats.json). */
export function formatFact<Value>(id: string): Value {
  const found = entries.find((one) => one.id === id);
  if (!found) throw new Error(`no format fact ${id}`);
  return found.value as Value;
}
