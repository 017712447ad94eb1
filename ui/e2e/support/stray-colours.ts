import type { Page } from 'playwright-core';

/**
 * Elements that are blue although nothing about a blue signal is said, or green at all: the tag, its words and the
 * colour. Grey is not looked at; hue and saturation are those of HSL.
 */
export function strayColours(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const hueOf = (colour: string): number | null => {
      const parts = /rgba?\(([\d.]+),? ([\d.]+),? ([\d.]+)(?:[,/ ]+([\d.]+))?\)/.exec(colour);
      if (parts === null || parts[4] === '0') return null;
      const [red = 0, green = 0, blue = 0] = parts.slice(1, 4).map((part) => Number(part) / 255);
      const [low, high] = [Math.min(red, green, blue), Math.max(red, green, blue)];
      const saturation = high === low ? 0 : (high - low) / (1 - Math.abs(high + low - 1));
      if (saturation < 0.25 || high - low < 0.12) return null;
      const turn =
        high === red
          ? ((green - blue) / (high - low)) % 6
          : high === green
            ? (blue - red) / (high - low) + 2
            : (red - green) / (high - low) + 4;
      return (turn * 60 + 360) % 360;
    };
    const found = new Set<string>();
    for (const element of document.querySelectorAll('*')) {
      if (element.closest('[class*="blue" i]') !== null || element.closest('head') !== null) continue;
      if (element.getClientRects().length === 0) continue;
      const style = getComputedStyle(element);
      const colours = [style.color, style.backgroundColor, style.fill, style.stroke];
      if (style.borderTopWidth !== '0px') colours.push(style.borderTopColor);
      if (style.outlineStyle !== 'none') colours.push(style.outlineColor);
      for (const colour of colours) {
        const hue = hueOf(colour);
        if (hue === null) continue;
        const name = hue >= 190 && hue <= 255 ? 'blue' : hue >= 75 && hue <= 175 ? 'green' : null;
        if (name !== null)
          found.add(`${name} ${colour} on ${element.tagName} "${element.textContent?.slice(0, 30) ?? ''}"`);
      }
    }
    return [...found];
  });
}
