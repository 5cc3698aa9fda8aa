import type { Locator, Page } from '@playwright/test';

/** Moves of the pointer in one measurement, and how far it goes round, in px. */
const MOVES = 90;
const RADIUS = 60;

type At = { readonly x: number; readonly y: number };

/** Frames per second that the page shows while the pointer goes round with a button down. */
export async function framesWhileGoingRound(page: Page, from: At, button: 'left' | 'middle'): Promise<number> {
  await page.mouse.move(from.x, from.y);
  await page.mouse.down({ button });
  await page.mouse.move(from.x + 12, from.y);
  await page.evaluate(() => {
    const counted = { frames: 0, from: performance.now(), on: true };
    const count = () => {
      counted.frames += 1;
      if (counted.on) requestAnimationFrame(count);
    };
    requestAnimationFrame(count);
    Object.assign(window, { counted });
  });
  for (let i = 0; i < MOVES; i++) {
    const angle = (i / MOVES) * 4 * Math.PI;
    await page.mouse.move(from.x + RADIUS * Math.cos(angle), from.y + RADIUS * Math.sin(angle));
  }
  const rate = await page.evaluate(() => {
    const { counted } = window as unknown as { counted: { frames: number; from: number; on: boolean } };
    counted.on = false;
    return (counted.frames * 1000) / (performance.now() - counted.from);
  });
  await page.mouse.up({ button });
  return rate;
}

export async function middleOf(locator: Locator): Promise<At> {
  const box = await locator.boundingBox();
  if (!box) throw new Error(`${locator} is not shown`);
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
}

/** Readies the page to tell how long it takes from Enter until every tag is current and painted, in ms. */
export async function watchEdits(page: Page): Promise<void> {
  await page.evaluate(() => {
    const times: { took: number; tags: number }[] = [];
    let pressed: number | undefined;
    const changed = new Set<Element>();
    const done = () => {
      const figures = [...document.querySelectorAll('.part-tag figure')];
      if (pressed === undefined || changed.size === 0) return;
      if (figures.some((figure) => figure.getAttribute('aria-busy') !== 'false')) return;
      const from = pressed;
      const tags = changed.size;
      pressed = undefined;
      // A frame is painted when the first task after its callbacks runs.
      requestAnimationFrame(() => {
        const channel = new MessageChannel();
        channel.port1.onmessage = () => times.push({ took: performance.now() - from, tags });
        channel.port2.postMessage(undefined);
      });
    };
    new MutationObserver((records) => {
      for (const { target } of records) {
        const element = target instanceof Element ? target : target.parentElement;
        const figure = element?.closest('.part-tag figure');
        if (figure && !(element === figure)) changed.add(figure);
      }
      done();
    }).observe(document.body, { subtree: true, childList: true, characterData: true, attributes: true });
    document.addEventListener(
      'keydown',
      (event) => {
        if (event.key !== 'Enter') return;
        pressed = event.timeStamp;
        changed.clear();
      },
      true,
    );
    Object.assign(window, { edits: times });
  });
}

export async function editsSeen(page: Page): Promise<{ took: number; tags: number }[]> {
  return page.evaluate(() => (window as unknown as { edits: { took: number; tags: number }[] }).edits);
}

/** The value that a share of all values does not exceed. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.ceil(share * sorted.length) - 1)] ?? Number.NaN;
}
