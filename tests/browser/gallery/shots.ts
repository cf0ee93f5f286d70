import { mkdir } from 'node:fs/promises';
import { launchChromium } from '../chromium';
import { serveGallery } from './serve';
import { galleryViews } from './views';

/**
 * Pictures of every screen: node --import tsx tests/browser/gallery/shots.ts FOLDER [NAME-PART] [SIZE] [SCHEME] [LOCALE]
 * With no size all three are taken, with no scheme day and night.
 */
const sizes = { bench: [1920, 1080], desk: [1440, 900], phone: [390, 844] } as const;
const [folder = 'gallery-shots', part = '', size = '', scheme = '', locale = 'en'] = process.argv.slice(2);

const { server, address } = await serveGallery();
const browser = await launchChromium();
await mkdir(folder, { recursive: true });
const names = ['kit', ...Object.keys(galleryViews)].filter((name) => name.includes(part));
for (const [sizeName, [width, height]] of Object.entries(sizes)) {
  if (size && size !== sizeName) continue;
  const page = await browser.newPage({ viewport: { width, height } });
  page.on('pageerror', (error) => console.log(`page error: ${error.message}`));
  page.on('console', (message) => message.type() === 'error' && console.log(`console: ${message.text()}`));
  for (const schemeName of ['day', 'night']) {
    if (scheme && scheme !== schemeName) continue;
    for (const name of names) {
      await page.goto(`${address}?screen=${name}&scheme=${schemeName}&locale=${locale}`);
      await page.waitForSelector('main');
      await page.evaluate(() => document.fonts.ready);
      const file = `${folder}/${name}-${sizeName}-${schemeName}-${locale}.png`;
      await page.screenshot({ path: file, fullPage: sizeName === 'phone' });
    }
  }
  await page.close();
}
console.log(`${names.length} screens in ${folder}`);
await browser.close();
await server.close();
