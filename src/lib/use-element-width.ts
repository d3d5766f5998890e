import { useLayoutEffect, useState, type RefObject } from 'react';

/** Width of an element in CSS px, followed as it changes; 0 before the first layout. */
export function useElementWidth(element: RefObject<HTMLElement | null>): number {
  const [width, setWidth] = useState(0);
  useLayoutEffect(() => {
    const target = element.current;
    if (!target) return;
    const observer = new ResizeObserver(([entry]) => setWidth(Math.round(entry.contentRect.width)));
    observer.observe(target);
    return () => observer.disconnect();
  }, [element]);
  return width;
}
