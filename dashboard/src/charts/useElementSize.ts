import { useCallback, useState, type RefCallback } from 'react';

/** px: below this a drawing has no room between its axes; while a page is laid out it may pass through */
const narrowest = 160;

/**
 * The width an element has on the page, followed as it changes.
 *
 * @param unmeasured px taken until the first measurement, and where nothing can be measured
 * @returns a ref for the element, and its width in px
 */
export function useElementSize<E extends Element>(unmeasured: number): [RefCallback<E>, number] {
  const [width, setWidth] = useState(unmeasured);
  const ref = useCallback((element: E | null) => {
    if (!element || typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(([entry]) => {
      const measured = Math.round(entry?.contentRect.width ?? 0);
      if (measured > 0) setWidth(Math.max(measured, narrowest));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width];
}
