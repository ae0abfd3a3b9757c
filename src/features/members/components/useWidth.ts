import { useEffect, useRef, useState } from 'react';

/** Width of an element in pixels, followed as it changes; for drawings that keep their letters' size. */
export function useWidth<T extends HTMLElement>(otherwise: number) {
  const element = useRef<T>(null);
  const [width, setWidth] = useState(otherwise);
  useEffect(() => {
    const node = element.current;
    if (!node) return;
    const observer = new ResizeObserver(([entry]) => {
      if (entry) setWidth(Math.max(300, Math.round(entry.contentRect.width)));
    });
    observer.observe(node);
    return () => observer.disconnect();
  }, []);
  return [element, width] as const;
}
