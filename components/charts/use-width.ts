'use client';
import { useLayoutEffect, useRef, useState } from 'react';

/** The width in px of the box that carries `ref`, followed as it changes; `initial` on the server and in print scripts. */
export function useWidth<E extends HTMLElement>(initial: number) {
  const ref = useRef<E>(null);
  const [width, setWidth] = useState(initial);
  useLayoutEffect(() => {
    const box = ref.current;
    if (!box) return;
    const watch = new ResizeObserver(([entry]) => {
      // A box that is not displayed has no width; it is measured when it is shown.
      if (entry && entry.contentRect.width > 0) setWidth(Math.floor(entry.contentRect.width));
    });
    watch.observe(box);
    return () => watch.disconnect();
  }, []);
  return { ref, width };
}
