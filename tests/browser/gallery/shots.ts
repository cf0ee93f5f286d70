import { mkdir } from 'node:fs/promises';
import { launchChromium } from '../chromium';
import { serveGallery } from './serve';
import { galleryViews } from './views';

/**
 * Pictures of every screen: node --import tsx tests/browser/gallery/shots.ts FOLDER [NAME-PART] [SIZE] [SCHEME] [LOCALE]
 * With no size all three are taken, with no scheme day and night.
 */
const sizes = { bench: [1920, 1080], desk: [1440, 900], phone: [390, 844] } as const;
const [folder = 'gallery-shots', part = '', size = '', only = '', locale = 'en'] = process.argv.slice(2);

const gallery = await serveGallery();
const browser = await launchChromium();
await mkdir(folder, { recursive: true });
const names = ['kit', ...Object.keys(galleryViews)].filter((name) => name.includes(part));
for (const [sizeName, [width, height]] of Object.entries(sizes)) {
  if (size && size !== sizeName) continue;
  const page = await browser.newPage({ viewport: { width, height } });
  page.on('pageerror', (error) => console.log(`page error: ${error.message}`));
  await page.goto(gallery.address);
  for (const scheme of ['day', 'night'] as const) {
    if (only && only !== scheme) continue;
    for (const screen of names) {
      await page.evaluate((shown) => window.showScreen(shown), { screen, scheme, locale });
      await page.evaluate(() => document.fonts.ready);
      const path = `${folder}/${screen}-${sizeName}-${scheme}-${locale}.png`;
      await page.screenshot({ path, fullPage: sizeName === 'phone' });
    }
  }
  await page.close();
}
console.log(`${names.length} screens in ${folder}`);
await browser.close();
await gallery.close();
