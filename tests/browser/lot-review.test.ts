import { readFile } from 'node:fs/promises';
import AxeBuilder from '@axe-core/playwright';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoAccounts } from '@/db/seed/demo-accounts';
import { launchChromium } from './chromium';
import { signInAtDesk } from './desk-person';
import { startProduct, type Product } from './product';

let product: Product;
let browser: Browser;
let desk: Page;
let address: string;

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(), launchChromium()]);
  const quality = demoAccounts.find((account) => account.roles.includes('quality-manager'))!;
  desk = await signInAtDesk(browser, product.url, quality.email!);
  await desk.goto(`${product.url}/lots`);
  address = (await desk.getByRole('link', { name: /-00$/ }).first().getAttribute('href'))!;
});
afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

const words = () => desk.locator('main').innerText();
const chart = () => desk.getByRole('slider');
const faults = async () => (await new AxeBuilder({ page: desk }).analyze()).violations.map(({ id }) => id);

/** The page answers to keys once its script runs. */
async function openReview(query = ''): Promise<void> {
  await desk.goto(product.url + address + query);
  await desk.waitForFunction(() => {
    const slider = document.querySelector('[role=slider]');
    return slider !== null && Object.keys(slider).some((key) => key.startsWith('__react'));
  });
}

describe('a lot whose trip point drifts, at the desk', () => {
  it('says from which board on, that it is not stable, and what the limits rest on', async () => {
    await openReview();
    const told = await words();
    expect(told).toMatch(/boards\s+passed first time/);
    expect(told).toContain('for trip, not stable');
    expect(told).toContain('Boards 201 to');
    expect(told).toContain('the first 30 boards of this lot');
  });

  it('names the stations that differ', async () => {
    expect(await words()).toMatch(/Stations differ: F\(1, \d+\)/);
  });

  it('is walked by keys, with the board told in words', async () => {
    await chart().focus();
    await desk.keyboard.press('End');
    expect(await chart().getAttribute('aria-valuetext')).toContain('Board 240 of 240');
    await desk.keyboard.press('ArrowLeft');
    expect(await chart().getAttribute('aria-valuetext')).toContain('Board 239 of 240');
    await desk.keyboard.press('Home');
    expect(await chart().getAttribute('aria-valuetext')).toContain('Board 1 of 240');
  });

  it('keeps what is shown in the address, through a reload', async () => {
    await desk.getByRole('button', { name: 'Release point' }).click();
    await desk.getByLabel('What is compared').selectOption('operator');
    await desk.getByLabel('Charts or tables').selectOption('tables');
    await desk.getByRole('table', { name: 'Release point, board by board' }).waitFor();
    expect(await faults()).toEqual([]);
    await desk.reload({ waitUntil: 'domcontentloaded' });
    await desk.getByRole('table', { name: 'Release point, board by board' }).waitFor();
    expect(desk.url()).toContain('quantity=release-volts');
    expect(await desk.getByLabel('What is compared').inputValue()).toBe('operator');
  });

  it('gives its picture as a file that stands alone', async () => {
    await openReview();
    const [saved] = await Promise.all([
      desk.waitForEvent('download'),
      desk.getByRole('button', { name: 'Save the chart as SVG' }).click(),
    ]);
    expect(saved.suggestedFilename()).toMatch(/^lot-.*-00-trip-volts\.svg$/);
    expect(await readFile((await saved.path())!, 'utf8')).not.toContain('var(');
    const [picture] = await Promise.all([
      desk.waitForEvent('download'),
      desk.getByRole('button', { name: 'Save the chart as PNG' }).click(),
    ]);
    const bytes = await readFile((await picture.path())!);
    expect(bytes.subarray(1, 4).toString('latin1')).toBe('PNG');
  });

  it('is free of axe findings at a desk and on a phone, where nothing is wider than the screen', async () => {
    expect(await faults()).toEqual([]);
    await desk.setViewportSize({ width: 390, height: 844 });
    await desk.waitForFunction(() => (document.querySelector('[role=slider] svg')?.clientWidth ?? 999) < 390);
    expect(await faults()).toEqual([]);
    expect(await desk.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
    await desk.setViewportSize({ width: 1440, height: 900 });
  });
});
