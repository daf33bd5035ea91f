import { useLayoutEffect, useRef, useState, type RefObject } from 'react';

/** Inner width of an element in whole pixels, kept up to date; `otherwise` until it is measured. */
export function useWidth<E extends HTMLElement>(otherwise: number): [RefObject<E | null>, number] {
  const element = useRef<E>(null);
  const [width, setWidth] = useState(otherwise);
  useLayoutEffect(() => {
    const measured = element.current;
    if (!measured) return undefined;
    const measure = (px: number) => px > 0 && setWidth(Math.floor(px));
    measure(measured.clientWidth);
    const observer = new ResizeObserver(([entry]) => entry && measure(entry.contentRect.width));
    observer.observe(measured);
    return () => observer.disconnect();
  }, []);
  return [element, width];
}
