/** One thing that is wrong with an input, in words a person can act on. */
export interface Problem {
  /** Which of several it is, where an input holds several: `strip 4, “Week 1 opener”`. */
  item?: string;
  /** Dotted path of the field, such as `pacing.rightVentricularLead.amplitudeV`; `(root)` for the whole. */
  path: string;
  /** The value given, as JSON; `missing` when there was none. */
  value: string;
  /** What would be accepted, with its unit. */
  allowed: string;
}

/** One line for one problem: which item, path, value, allowed range. */
export function problemLine(problem: Problem): string {
  const item = problem.item === undefined ? '' : `${problem.item}: `;
  return `${item}${problem.path}: ${problem.value} is not allowed; allowed: ${problem.allowed}`;
}

/** Input that was refused; carries every problem found, not only the first. */
export class InvalidInputError extends Error {
  readonly problems: readonly Problem[];

  constructor(problems: readonly Problem[]) {
    super(problems.map(problemLine).join('\n'));
    this.name = 'InvalidInputError';
    this.problems = problems;
  }
}
