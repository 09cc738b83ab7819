import { useLayoutEffect, useState, type RefObject } from 'react';
import type { Size } from '../logic/view.ts';

/** The inner size of an element, followed as it changes; null before it is measured. */
export function useSize(ref: RefObject<HTMLElement | null>): Size | null {
  const [size, setSize] = useState<Size | null>(null);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const measure = () => {
      const next = { width: element.clientWidth, height: element.clientHeight };
      setSize((before) =>
        before?.width === next.width && before.height === next.height ? before : next,
      );
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, [ref]);
  return size;
}
