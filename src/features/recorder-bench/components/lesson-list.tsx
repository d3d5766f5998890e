import { lessons, type Lesson, type LessonWords } from '../../../../shared/recorder-bench/lessons';
import { classNames } from '../../../lib/class-names';

interface LessonListProps {
  /** A few characters for each, by id. */
  figures: Readonly<Record<string, string>>;
  open: Lesson | null;
  /** What the open lesson says of the traces shown; null while they are measured or were changed. */
  words: LessonWords | null;
  onOpen(lesson: Lesson): void;
}

/** Pitfalls; opening one puts its strip and its settings on the bench. */
export function LessonList({ figures, open, words, onOpen }: LessonListProps) {
  return (
    <section aria-label="Lessons">
      <h2 className="border-b border-edge pb-1.5 text-section font-semibold">One-click lessons</h2>
      <ul>
        {lessons.map((lesson) => {
          const isOpen = open?.id === lesson.id;
          return (
            <li key={lesson.id} className="border-b border-rule">
              <button
                type="button"
                aria-expanded={isOpen}
                onClick={() => onOpen(lesson)}
                className="flex w-full items-baseline justify-between gap-4 py-2.5 text-left text-body hover:text-teal-dark pointer-coarse:min-h-11"
              >
                <span className={classNames(isOpen && 'font-semibold')}>{lesson.title}</span>
                <span className="font-mono text-dense whitespace-nowrap text-ink-3">
                  {figures[lesson.id] ?? ''}
                </span>
              </button>
              {isOpen && (
                <p
                  aria-live="polite"
                  className="border-l-[3px] border-l-teal bg-teal-tint px-3.5 py-2.5 text-body"
                >
                  {words?.text ??
                    'The bench no longer shows this lesson’s settings. Open it again to see its figures.'}
                </p>
              )}
            </li>
          );
        })}
      </ul>
      <p className="mt-2 text-caption text-ink-3">
        Every number is measured on the traces shown. For education: judge real recordings by local protocols
        and licensed practice.
      </p>
    </section>
  );
}
