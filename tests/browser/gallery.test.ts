import AxeBuilder from '@axe-core/playwright';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Scheme } from '@/components/ui/scheme';
import { launchChromium } from './chromium';
import { serveGallery } from './gallery/serve';
import { galleryViews } from './gallery/views';

/** Every screen of the bench, rendered by itself: readable, reachable, inside its frame. */

let browser: Browser;
let page: Page;
let gallery: Awaited<ReturnType<typeof serveGallery>>;

beforeAll(async () => {
  gallery = await serveGallery();
  browser = await launchChromium();
  const context = await browser.newContext({ reducedMotion: 'reduce' });
  page = await context.newPage();
  await page.goto(gallery.address);
}, 180_000);
afterAll(async () => {
  await browser?.close();
  await gallery?.close();
});

async function open(screen: string, [width, height]: readonly [number, number], scheme: Scheme = 'day', locale = 'en') {
  const size = page.viewportSize();
  if (size?.width !== width || size.height !== height) await page.setViewportSize({ width, height });
  await page.evaluate((shown) => window.showScreen(shown), { screen, scheme, locale });
  await page.evaluate(() => document.fonts.ready);
}

const names = Object.keys(galleryViews);
const bench = [1920, 1080] as const;

interface Press {
  name: string;
  x: number;
  y: number;
  width: number;
  height: number;
}

/** Everything of the bench that can be pressed, with its place in pixels; the practice tray is not the bench. */
const presses = (): Promise<Press[]> =>
  page.evaluate(() => {
    const flood = document.querySelector('[data-flood]');
    return [...(flood ?? document).querySelectorAll('button, a[href], select, input')]
      .filter((element) => !element.closest('aside'))
      .map((element) => {
        const { x, y, width, height } = element.getBoundingClientRect();
        return { name: element.textContent ?? '', x, y, width, height };
      });
  });

describe.each(['day', 'night'] as const)('by %s', (scheme) => {
  it.each(names)('%s passes axe', async (name) => {
    await open(name, bench, scheme);
    const axe = new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']);
    // Nothing but the colours differs by night.
    const { violations } = await (scheme === 'day' ? axe : axe.withRules(['color-contrast'])).analyze();
    expect(
      violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.target.join(' ')).join(', ')}`),
    ).toEqual([]);
  });
});

describe.each([
  ['1920 × 1080', bench, 100, 24],
  ['1440 × 900', [1440, 900], 100, 24],
  ['a phone', [390, 844], 46, 8],
] as const)('at %s', (_, size, least, gap) => {
  it.each(names)(`%s can be touched: ${least} px high, ${gap} apart`, async (name) => {
    await open(name, size);
    const all = await presses();
    for (const press of all) expect(press.height, press.name).toBeGreaterThanOrEqual(least - 0.5);
    for (const a of all) {
      for (const b of all) {
        if (a === b) continue;
        const apartX = Math.max(a.x - b.x - b.width, b.x - a.x - a.width);
        const apartY = Math.max(a.y - b.y - b.height, b.y - a.y - a.height);
        expect(Math.max(apartX, apartY), `${a.name} and ${b.name}`).toBeGreaterThanOrEqual(gap - 0.5);
      }
    }
  });
});

describe.each(['en', 'de'])('in %s', (locale) => {
  it.each(names)('%s keeps its words inside their pane', async (name) => {
    await open(name, bench, 'day', locale);
    const outside = await page.evaluate(() => {
      const foot = document.querySelector('footer')?.getBoundingClientRect();
      const words = [...document.querySelectorAll('main h1, main h2, main p, main li, main table, main button')];
      return words
        .filter((element) => !element.closest('footer') && !element.closest('[data-flood]'))
        .filter((element) => {
          const box = element.getBoundingClientRect();
          const scrolls = element.closest('.overflow-y-auto');
          return !scrolls && (box.right > innerWidth + 1 || (foot !== undefined && box.bottom > foot.top + 1));
        })
        .map((element) => element.textContent);
    });
    expect(outside).toEqual([]);
  });
});
