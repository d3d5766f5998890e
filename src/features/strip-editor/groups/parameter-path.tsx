import { useId, useState } from 'react';
import { classNames } from '../../../lib/class-names';
import { tabletQuery, useMediaQuery } from '../../../lib/use-media-query';
import type { ParametersEditor } from '../state/use-parameters';
import { stops } from './stops';

/** The path of the impulse with its six stops; the open one shows its fields below. */
export function ParameterPath({ editor }: { editor: ParametersEditor }) {
  const [open, setOpen] = useState('patient');
  const panelId = useId();
  const isTablet = useMediaQuery(tabletQuery);
  const current = stops.find((stop) => stop.id === open) ?? stops[0];
  return (
    <section aria-label="Parameters" className="px-4 pb-8 tablet:px-6">
      <h2 className="sr-only">Parameters</h2>
      <ol className="grid grid-cols-[minmax(0,1fr)] tablet:grid-cols-3 desk:grid-cols-6">
        {stops.map((stop) => {
          const chosen = stop.id === current.id;
          const [first, second] = stop.lines(editor.parameters);
          return (
            <li key={stop.id}>
              <button
                type="button"
                aria-expanded={chosen}
                aria-controls={chosen ? panelId : undefined}
                onClick={() => setOpen(stop.id)}
                className={classNames(
                  'group flex w-full flex-col border-b border-rule py-2.5 text-left desk:border-b-0 desk:pt-0',
                  chosen && 'border-l-4 border-l-teal pl-3 desk:border-l-0 desk:pl-0',
                )}
              >
                <span aria-hidden="true" className="hidden h-4 items-center desk:flex">
                  <span
                    className={classNames(
                      'size-2.5 rounded-full border',
                      chosen ? 'border-teal bg-teal' : 'border-edge bg-paper group-hover:bg-sunk',
                    )}
                  />
                  <span className={classNames('grow', chosen ? 'h-[3px] bg-teal' : 'h-px bg-edge')} />
                </span>
                <span
                  className={classNames(
                    'text-section',
                    chosen ? 'font-semibold text-teal-dark' : 'font-medium',
                  )}
                >
                  {stop.title}
                </span>
                <span className="pr-3 text-dense text-ink-2">{first}</span>
                <span className="min-h-4.5 pr-3 text-dense text-ink-2">{second}</span>
              </button>
              {chosen && !isTablet && (
                <div id={panelId} className="border-b border-rule py-4">
                  <stop.Fields editor={editor} />
                </div>
              )}
            </li>
          );
        })}
      </ol>
      {isTablet && (
        <div id={panelId} className="mt-4 border-t border-rule pt-5">
          <current.Fields editor={editor} />
        </div>
      )}
    </section>
  );
}
