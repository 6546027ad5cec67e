'use client';
import { type RefObject, useEffect, useLayoutEffect, useRef, useState } from 'react';
import { type Anchor, betweenFingers, clampZoom } from './zoom';

type Place = { left: number; top: number };

/**
 * The zoom of the photo in its frame: by buttons and keys about the middle of what is in sight, by two fingers about
 * the place between them, which also pan. `isPinching` tells others to leave the fingers alone.
 */
export function useZoom(frame: RefObject<HTMLElement | null>, picture: RefObject<SVGSVGElement | null>) {
  const [view, setView] = useState<{ zoom: number; anchor: Anchor | null }>({ zoom: 1, anchor: null });
  const zoomNow = useRef(1);
  const isPinching = useRef(false);

  /** What lies at a place of the screen, to be found there again after the zoom. */
  function anchorAt(x: number, y: number): Anchor | null {
    const [box, outer] = [picture.current?.getBoundingClientRect(), frame.current?.getBoundingClientRect()];
    if (!box || !outer) return null;
    return {
      shareX: (x - box.left) / box.width,
      shareY: (y - box.top) / box.height,
      atX: x - outer.left,
      atY: y - outer.top,
    };
  }
  function setZoom(zoom: number) {
    const outer = frame.current?.getBoundingClientRect();
    const anchor = outer ? anchorAt(outer.left + outer.width / 2, outer.top + outer.height / 2) : null;
    setView({ zoom: clampZoom(zoom), anchor });
  }

  useLayoutEffect(() => {
    zoomNow.current = view.zoom;
    const [box, outer] = [picture.current?.getBoundingClientRect(), frame.current];
    if (!view.anchor || !box || !outer) return;
    const { left, top } = outer.getBoundingClientRect();
    const off: Place = {
      left: box.left + view.anchor.shareX * box.width - (left + view.anchor.atX),
      top: box.top + view.anchor.shareY * box.height - (top + view.anchor.atY),
    };
    outer.scrollBy({ ...off, behavior: 'instant' });
  }, [view, frame, picture]);

  useEffect(() => {
    const box = frame.current;
    if (!box) return;
    let start: { zoom: number; distance: number; anchor: Anchor } | null = null;
    function begin(event: TouchEvent) {
      if (event.touches.length !== 2) return;
      const { distance, x, y } = betweenFingers(event.touches[0]!, event.touches[1]!);
      const anchor = anchorAt(x, y);
      if (anchor) start = { zoom: zoomNow.current, distance: Math.max(1, distance), anchor };
      isPinching.current = true;
    }
    function go(event: TouchEvent) {
      // A mark that is held moves; the page under it does not.
      const isOnMark = event.target instanceof Element && event.target.closest('[role="button"]') !== null;
      if (isOnMark && event.cancelable) event.preventDefault();
      if (!start || event.touches.length !== 2) return;
      // Otherwise the browser would enlarge or scroll the page.
      if (event.cancelable) event.preventDefault();
      const { distance, x, y } = betweenFingers(event.touches[0]!, event.touches[1]!);
      const outer = box!.getBoundingClientRect();
      const anchor = { ...start.anchor, atX: x - outer.left, atY: y - outer.top };
      setView({ zoom: clampZoom((start.zoom * distance) / start.distance), anchor });
    }
    function end(event: TouchEvent) {
      if (event.touches.length < 2) start = null;
      // The last finger of a pinch sets no mark: its pointer goes up before this.
      if (event.touches.length === 0) setTimeout(() => (isPinching.current = false));
    }
    box.addEventListener('touchstart', begin, { passive: true });
    box.addEventListener('touchmove', go, { passive: false });
    box.addEventListener('touchend', end);
    box.addEventListener('touchcancel', end);
    return () => {
      box.removeEventListener('touchstart', begin);
      box.removeEventListener('touchmove', go);
      box.removeEventListener('touchend', end);
      box.removeEventListener('touchcancel', end);
    };
    // The refs never change.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);
  return { zoom: view.zoom, setZoom, isPinching };
}

export type ZoomHandle = ReturnType<typeof useZoom>;
