import AxeBuilder from '@axe-core/playwright';
import type { Browser, Page } from 'playwright-core';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoAccounts, demoPassword } from '@/db/seed/demo-accounts';
import { launchChromium } from './chromium';
import { signInAtDesk } from './desk-person';
import { startProduct, type Product } from './product';

const emailOf = (name: string) => demoAccounts.find((account) => account.name === name)!.email!;
const code = 'CB2420';

let product: Product;
let browser: Browser;
let engineer: Page;
let quality: Page;

async function findNothing(page: Page): Promise<void> {
  const axe = new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']);
  const { violations } = await axe.analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]!.html.slice(0, 160)}`)).toEqual([]);
}

async function press(page: Page, name: string | RegExp): Promise<void> {
  await page.getByRole('button', { name }).focus();
  await page.keyboard.press('Enter');
}

async function type(page: Page, label: string | RegExp, text: string): Promise<void> {
  await page.getByLabel(label, { exact: true }).first().focus();
  await page.keyboard.press('Control+A');
  await page.keyboard.type(text);
}

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(), launchChromium()]);
  [engineer, quality] = await Promise.all([
    signInAtDesk(browser, product.url, emailOf('T. Marsden')),
    signInAtDesk(browser, product.url, emailOf('A. Boyle')),
  ]);
});
afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

describe('limits of a board type, by keyboard', () => {
  it('says while it is typed what a narrower limit costs, and offers one fix that holds', async () => {
    await engineer.goto(`${product.url}/board-types/${code}`);
    await press(engineer, 'Begin a draft');
    await engineer.getByText('Draft 2').waitFor();
    await type(engineer, 'Release point, at most', '24.2');
    await engineer.getByText('Limits cannot be met').first().waitFor();
    await engineer
      .getByText(/\d+ boards? in 1(00|,000) releases? above 24\.20 V/)
      .first()
      .waitFor();
    await findNothing(engineer);
    await press(engineer, /^Use /);
    await engineer.getByText('Limits cannot be met').waitFor({ state: 'detached' });
  });

  it('keeps a text that is no value, under its sentence', async () => {
    await type(engineer, 'R1 upper end', 'large');
    // Beside the field on a phone, below the drawing here.
    await engineer.getByText('“large” is not a value').last().waitFor();
    await type(engineer, 'R1 upper end', '22k');
    await engineer.keyboard.press('Tab');
    expect(await engineer.getByLabel('R1 upper end', { exact: true }).inputValue()).toBe('22 kΩ');
  });

  it('refuses a photograph of another type by name, and takes one with a frame to move', async () => {
    const picture = sharp({ create: { width: 300, height: 200, channels: 3, background: '#27613b' } });
    const choose = engineer.locator('input[type=file]').first();
    await choose.setInputFiles({ name: 'trimmer.jpg', mimeType: 'image/jpeg', buffer: await picture.gif().toBuffer() });
    await engineer.getByText('trimmer.jpg is a GIF. Use JPEG, PNG or WebP, at most 8 MB.').waitFor();
    await choose.setInputFiles({ name: 'board.jpg', mimeType: 'image/jpeg', buffer: await picture.jpeg().toBuffer() });
    const frame = engineer.getByRole('button', { name: /^Frame around the trimmer: 40 % from the left/ });
    await frame.focus();
    await engineer.keyboard.press('ArrowRight');
    await engineer.getByRole('button', { name: /^Frame around the trimmer: 41 % from the left/ }).waitFor();
  });

  it('is asked for with the reason, approved by somebody else, and the old limits stay in the history', async () => {
    await press(engineer, 'Save the draft');
    await engineer.getByText('Nothing to save.').waitFor();
    await press(engineer, 'Ask for approval');
    await type(engineer, 'What changed and why', 'The customer asks for an earlier release');
    await engineer.getByRole('dialog').getByRole('button', { name: 'Ask for approval' }).press('Enter');
    await engineer.getByRole('button', { name: 'Take it back' }).waitFor();
    expect(await engineer.getByRole('button', { name: /Approve/ }).count()).toBe(0);

    await quality.goto(`${product.url}/board-types/${code}`);
    await press(quality, /^Approve/);
    await quality.getByText('The customer asks for an earlier release').first().waitFor();
    await findNothing(quality);
    await type(quality, /^Password/, demoPassword);
    await press(quality, 'Sign and approve');
    await quality.getByText(/^Revision 2$/).waitFor();
    const history = quality.getByRole('table', { name: 'History of the limits' });
    expect(await history.getByRole('row').allInnerTexts()).toEqual([
      expect.stringContaining('No.'),
      expect.stringMatching(/23\.90–24\.20[^]*Marsden[^]*Boyle[^]*in use[^]*The customer asks/),
      expect.stringMatching(/23\.90–24\.65[^]*Marsden[^]*Boyle/),
    ]);
    await findNothing(quality);
  });
});
