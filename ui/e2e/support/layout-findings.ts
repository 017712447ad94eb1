import type { Page } from 'playwright-core';

/** Smallest edge of anything that is touched on the phone, in CSS pixels; half a pixel is rounding. */
const smallestTarget = 47.5;

/**
 * What is wrong with the geometry of a phone page as it stands: it scrolls sideways, something lies outside the window,
 * words are cut off, a target is too small. One line each.
 */
export function layoutFindings(page: Page): Promise<string[]> {
  return page.evaluate((smallest) => {
    const found: string[] = [];
    const width = globalThis.innerWidth;
    const over = document.documentElement.scrollWidth - width;
    if (over > 0) found.push(`scrolls sideways by ${over} px`);
    const name = (element: Element): string =>
      `${element.tagName.toLowerCase()} "${(element.textContent ?? '').trim().slice(0, 40)}"`;
    for (const element of document.querySelectorAll('.phone *')) {
      if (element.closest('svg, .unseen') !== null) continue;
      const box = element.getBoundingClientRect();
      if (box.width === 0 || box.height === 0) continue;
      if (box.right > width + 1 || box.left < -1) found.push(`outside the window: ${name(element)}`);
      const isInline = getComputedStyle(element).display === 'inline';
      const cut = element.scrollWidth - element.clientWidth;
      if (!isInline && element.clientWidth > 0 && cut > 1)
        found.push(`words cut off by ${cut} px: ${name(element)}`);
      const isTarget = element.matches('button, a, input, select, textarea, [role=button]');
      if (isTarget && Math.min(box.width, box.height) < smallest)
        found.push(`${box.width.toFixed()} × ${box.height.toFixed()} px to touch: ${name(element)}`);
    }
    return found;
  }, smallestTarget);
}

/** Doubles the type of the page, as a reader's wish for 200 % text does, or puts it back, and waits until it is drawn. */
export function setLargeText(page: Page, isLarge: boolean): Promise<void> {
  return page.evaluate(async (large) => {
    document.documentElement.style.fontSize = large ? '28px' : '';
    for (let frame = 0; frame < 2; frame += 1) await new Promise(requestAnimationFrame);
  }, isLarge);
}

/** Height of the bar, and how much of the window the foot takes, 0 to 1. */
export function footSize(page: Page): Promise<{ bar: number; share: number }> {
  return page.evaluate(() => {
    const foot = document.querySelector('main [class*="foot"]');
    const bar = foot?.querySelector('[class*="bar"]');
    return {
      bar: bar?.getBoundingClientRect().height ?? 0,
      share: (foot?.getBoundingClientRect().height ?? 0) / globalThis.innerHeight,
    };
  });
}
