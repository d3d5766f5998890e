import { ApiError } from '../../../api/http';
import { Notice } from '../../../components/notice';

/** Why a file was refused: the sentence, and every problem with its preset, field, value and range. */
export function ImportProblems({ error }: { error: Error }) {
  const problems = error instanceof ApiError ? error.problems : [];
  const more = error instanceof ApiError ? Number(error.details.more ?? 0) : 0;
  return (
    <div className="flex flex-col gap-3">
      <Notice kind="red" title="Not imported.">
        {error instanceof ApiError ? error.message : 'Something went wrong; try again.'}
      </Notice>
      {problems.length > 0 && (
        <ul
          aria-label="Problems"
          tabIndex={0}
          className="max-h-64 overflow-auto border-y border-rule-strong pr-1 text-dense"
        >
          {problems.map((problem, index) => (
            <li key={index} className="border-b border-rule py-2 last:border-b-0">
              {problem.item && (
                <span className="block font-medium break-words first-letter:uppercase">{problem.item}</span>
              )}
              <span className="block break-words">
                <code className="font-mono text-caption">{problem.path}</code>: {problem.value}
              </span>
              <span className="block break-words text-ink-2">Allowed: {problem.allowed}.</span>
            </li>
          ))}
          {more > 0 && <li className="py-2 text-ink-2">And {more} more.</li>}
        </ul>
      )}
    </div>
  );
}
