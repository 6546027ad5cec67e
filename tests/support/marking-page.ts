import type { Page } from 'playwright-core';

type Point = { x: number; y: number };

/** Opens a page for marking and waits until its script has taken it over. */
export async function openMarking(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await page.waitForFunction(() => {
    const plate = document.querySelector('svg[aria-label^="Plate photo"]');
    return plate !== null && Object.keys(plate).some((key) => key.startsWith('__reactProps'));
  });
}

/** Where a place of the photo, in its own pixels, lies on the screen; it is scrolled into sight unless told not to. */
export async function onScreen(page: Page, at: Point, isScrolled = true): Promise<Point> {
  return page.evaluate(
    ({ x, y, isScrolled }) => {
      const plate = document.querySelector<SVGSVGElement>('svg[aria-label^="Plate photo"]')!;
      const { width, height } = plate.viewBox.baseVal;
      const place = () => {
        const box = plate.getBoundingClientRect();
        return { x: box.left + (x / width) * box.width, y: box.top + (y / height) * box.height };
      };
      // Into the middle of the window, clear of whatever sticks to its edges.
      if (isScrolled) window.scrollBy({ top: place().y - window.innerHeight / 2, behavior: 'instant' });
      return place();
    },
    { ...at, isScrolled },
  );
}

export async function clickPhoto(page: Page, at: Point): Promise<void> {
  const { x, y } = await onScreen(page, at);
  await page.mouse.click(x, y);
}

export async function tapPhoto(page: Page, at: Point): Promise<void> {
  const { x, y } = await onScreen(page, at);
  await page.touchscreen.tap(x, y);
}

/** Moves fingers over the screen; each of `steps` is where they are. They are lifted at the end. */
export async function moveFingers(
  page: Page,
  steps: Point[][],
  beforeLift?: () => Promise<void>,
): Promise<void> {
  const session = await page.context().newCDPSession(page);
  const touchPoints = (fingers: Point[]) => fingers.map(({ x, y }, id) => ({ x, y, id }));
  for (const [index, fingers] of steps.entries())
    await session.send('Input.dispatchTouchEvent', {
      type: index === 0 ? 'touchStart' : 'touchMove',
      touchPoints: touchPoints(fingers),
    });
  await beforeLift?.();
  await session.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
  await session.detach();
}

/** A straight way in small steps. */
export function wayOf(from: Point, to: Point, count = 8): Point[] {
  return Array.from({ length: count + 1 }, (_, i) => ({
    x: from.x + ((to.x - from.x) * i) / count,
    y: from.y + ((to.y - from.y) * i) / count,
  }));
}

export const modeButton = (page: Page, name: string) => page.getByRole('button', { name, exact: true });

/** Says of every lane that it is of the crude, and fills in what else a plate needs beside its marks. */
export async function fillFacts(page: Page): Promise<void> {
  for (const holds of await page.getByLabel('Holds').all()) await holds.selectOption('crude');
  await page.getByLabel('Stationary phase').fill('silica gel 60 F254');
  await page.getByLabel('Eluent').fill('hexane / ethyl acetate 4:1');
  await page.getByLabel('Width').fill('50');
  await page.getByLabel('Height').fill('100');
}
