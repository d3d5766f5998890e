import { useEffect, useRef, useState, type DragEvent } from 'react';
import { classNames } from '../lib/class-names';
import { Button } from './button';

interface FileDropProps {
  /** What is wanted, in a sentence. */
  text: string;
  /** Endings or media types, as `accept` takes them. */
  accept: string;
  label: string;
  busy?: string;
  onFile(file: File): void;
}

/** A place to drop one file on, with a button that opens the system's chooser. */
export function FileDrop({ text, accept, label, busy, onFile }: FileDropProps) {
  const input = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  // The browser would open a file that is dropped beside the place, and leave the page.
  useEffect(() => {
    const keepPage = (event: Event): void => event.preventDefault();
    const kinds = ['dragover', 'drop'];
    for (const kind of kinds) window.addEventListener(kind, keepPage);
    return () => kinds.forEach((kind) => window.removeEventListener(kind, keepPage));
  }, []);
  const drop = (event: DragEvent): void => {
    event.preventDefault();
    setOver(false);
    const [file] = event.dataTransfer.files;
    if (file && !busy) onFile(file);
  };
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      className={classNames(
        'flex flex-col items-center gap-3 rounded-control border border-dashed px-5 py-7 text-center',
        over ? 'border-teal bg-teal-tint' : 'border-edge',
      )}
    >
      <p className="text-body text-ink-2">{text}</p>
      <input
        ref={input}
        type="file"
        accept={accept}
        aria-label={label}
        tabIndex={-1}
        className="sr-only"
        onChange={(event) => {
          const [file] = event.target.files ?? [];
          if (file) onFile(file);
          // The same file chosen again is a new choice.
          event.target.value = '';
        }}
      />
      <Button disabled={busy !== undefined} onClick={() => input.current?.click()}>
        {busy ?? label}
      </Button>
    </div>
  );
}
