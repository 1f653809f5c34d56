import { useLayoutEffect, useRef, useState } from 'react';

/** A ref to put on an element and its inner width in whole CSS pixels; 0 until it is laid out. */
export function useElementWidth<Element extends HTMLElement>() {
  const ref = useRef<Element>(null);
  const [widthPx, setWidthPx] = useState(0);
  useLayoutEffect(() => {
    const element = ref.current;
    if (element === null) return;
    setWidthPx(Math.floor(element.clientWidth));
    const observer = new ResizeObserver(([entry]) => {
      if (entry) setWidthPx(Math.floor(entry.contentRect.width));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, widthPx] as const;
}
