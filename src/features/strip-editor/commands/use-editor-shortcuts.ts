import { useEffect, useRef } from 'react';

interface EditorCommands {
  undo(): void;
  redo(): void;
  save(): void;
}

/** Typing keeps its own undo. */
function isTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement;
}

/** Ctrl or Cmd with Z, Shift+Z or Y, and S. */
export function useEditorShortcuts(commands: EditorCommands): void {
  const latest = useRef(commands);
  useEffect(() => {
    latest.current = commands;
  });
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent): void => {
      if (!event.ctrlKey && !event.metaKey) return;
      const key = event.key.toLowerCase();
      const command =
        key === 's'
          ? latest.current.save
          : isTyping(event.target)
            ? null
            : key === 'y' || (key === 'z' && event.shiftKey)
              ? latest.current.redo
              : key === 'z'
                ? latest.current.undo
                : null;
      if (!command) return;
      event.preventDefault();
      command();
    };
    window.addEventListener('keydown', onKeyDown);
    return () => window.removeEventListener('keydown', onKeyDown);
  }, []);
}
