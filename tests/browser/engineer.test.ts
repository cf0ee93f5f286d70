import AxeBuilder from '@axe-core/playwright';
import type { Browser, Page } from 'playwright-core';
import { Pool } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoAccounts, demoPassword } from '@/db/seed/demo-accounts';
import { BenchPerson } from './bench-person';
import { launchChromium } from './chromium';
import { signInAtDesk } from './desk-person';
import { startProduct, type Product } from './product';

const emailOf = (name: string) => demoAccounts.find((account) => account.name === name)!.email!;

let product: Product;
let browser: Browser;
let pool: Pool;
/** T. Marsden, who writes the draft of the demo. */
let writer: Page;
let quality: Page;
let sequence: string;

const inBrowser = (page: Page, path: string) => page.goto(product.url + path);
const draft = () => `/sequences/${sequence}/draft`;

async function findNothing(page: Page): Promise<void> {
  const axe = new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']);
  const { violations } = await axe.analyze();
  expect(
    violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`),
  ).toEqual([]);
}

/** Types into the blank that has this label, by keyboard alone once it has the focus. */
async function typeInto(page: Page, label: string | RegExp, text: string): Promise<void> {
  const blank = page.getByLabel(label, { exact: true }).first();
  await blank.focus();
  await page.keyboard.press('Control+A');
  await page.keyboard.type(text);
}

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(), launchChromium()]);
  pool = new Pool({ connectionString: product.databaseUrl, max: 2 });
  sequence = (await pool.query(`select id from sequences where name = 'CB1210 cutoff trim'`)).rows[0].id;
  [writer, quality] = await Promise.all([
    signInAtDesk(browser, product.url, emailOf('T. Marsden')),
    signInAtDesk(browser, product.url, emailOf('A. Boyle')),
  ]);
});
afterAll(async () => {
  await pool?.end();
  await browser?.close();
  await product?.stop();
});

describe('a draft from the desk to the floor', () => {
  it('is edited by keyboard, keeps bad text, and is saved as typed', async () => {
    await inBrowser(writer, draft());
    await writer.getByText(/Draft/).first().waitFor();
    await typeInto(writer, 'Repeats', 'four');
    await writer.getByText(/Repeats: /).waitFor();
    expect(await writer.getByLabel('Repeats').first().inputValue()).toBe('four');
    await typeInto(writer, 'Repeats', '4');
    await writer.getByText(/Repeats: /).waitFor({ state: 'hidden' });
    await writer.waitForFunction(() => /[Ss]aved \d\d:\d\d/.test(document.querySelector('main')?.textContent ?? ''));
    const { rows } = await pool.query(
      `select step ->> 'repeats' as repeats from sequence_revisions, jsonb_array_elements(data -> 'steps') step
       where sequence_id = $1 and status = 'draft' and step ->> 'kind' = 'verify'`,
      [sequence],
    );
    expect(rows[0]).toEqual({ repeats: '4' });
    await findNothing(writer);
  });

  it('shows an error beside its field with a mend that works, and undo brings it back', async () => {
    const settle = writer.getByLabel('Settle time, ms').nth(4);
    const before = await settle.inputValue();
    await settle.focus();
    await writer.keyboard.press('Control+A');
    await writer.keyboard.type('1');
    const mend = writer.getByRole('button', { name: /^Use / }).last();
    await mend.focus();
    await writer.keyboard.press('Enter');
    await writer.getByText('error to fix').waitFor({ state: 'hidden' });
    expect(await settle.inputValue()).not.toBe('1');
    await settle.focus();
    await writer.keyboard.press('Control+z');
    await writer.keyboard.press('Control+z');
    expect(await settle.inputValue()).toBe(before);
  });

  it('is dry run on simulated boards beside the revision in use, and the result is kept with it', async () => {
    await typeInto(writer, 'Boards', '40');
    await writer.getByRole('button', { name: /Start a dry run|Run again/ }).click();
    await writer.getByText(/would pass first time/).waitFor({ timeout: 90_000 });
    await writer.getByRole('button', { name: 'Keep it with the revision' }).click();
    await writer.getByText('Kept with the revision').waitFor();
  });

  it('is tried on a station by somebody at that bench, outside every yield', async () => {
    await writer.getByRole('button', { name: 'Try on a station…' }).click();
    await writer.getByLabel(/Station 1,/).check();
    await writer.getByLabel('Note for the bench').fill('Try one board of the box.');
    await writer.getByRole('button', { name: 'Offer the draft' }).click();
    await writer.getByRole('button', { name: 'Offer the draft' }).waitFor({ state: 'hidden' });

    const operator = demoAccounts.find((account) => account.roles.includes('operator') && account.badgeNumber)!;
    const page = await (await browser.newContext({ viewport: { width: 1920, height: 1080 } })).newPage();
    const person = await BenchPerson.standAt(page, product.url, 'Station 1');
    await person.signIn(operator.badgeNumber!, operator.pin!);
    await page.getByText('offers draft').waitFor();
    await person.press('Start the trial');
    await page
      .getByText(/Engineering run/)
      .first()
      .waitFor();
    const tested = await person.testNextBoard();
    expect(tested.words).toContain('Engineering run');
    const { rows } = await pool.query(
      `select kind, verdict, offer_id is not null as offered, supply_off_confirmed as off from runs where kind <> 'production'`,
    );
    expect(rows).toEqual([{ kind: 'engineering', verdict: tested.verdict, offered: true, off: true }]);
    const counted = await pool.query(
      `select count(*)::int as n from runs where kind = 'production' and ended_at > now() - interval '10 minutes'`,
    );
    expect(counted.rows[0].n).toBe(0);
    await page.close();
  });

  it('is submitted with a note, and its writer never sees the release', async () => {
    await inBrowser(writer, draft());
    for (const reason of await writer.getByLabel(/^Reason: /).all())
      if ((await reason.inputValue()) === '') await reason.fill('Seen and accepted for this draft.');
    await writer.waitForFunction(() => !/Not saved|Saving/.test(document.querySelector('main')?.textContent ?? ''));
    await writer.getByRole('button', { name: /^Submit r\d/ }).click();
    await writer
      .getByLabel('What changed and why')
      .fill('Four repeats show a scratchy wiper; the customer asks for it.');
    await writer
      .getByRole('dialog')
      .getByRole('button', { name: /^Submit r\d/ })
      .click();
    await writer.getByRole('dialog').waitFor({ state: 'hidden' });
    await inBrowser(writer, `/sequences/${sequence}/compare`);
    await writer.getByText('Compare revisions').waitFor();
    expect(await writer.getByRole('button', { name: /Sign and release/ }).count()).toBe(0);
    await findNothing(writer);
  });

  it('is released by another account with a signature; a wrong password keeps the choice', async () => {
    await inBrowser(quality, `/sequences/${sequence}/compare`);
    await quality.getByText('Four repeats show a scratchy wiper').waitFor();
    await quality.getByRole('button', { name: /^Sign and release r\d+…/ }).click();
    const dialog = quality.getByRole('dialog');
    await dialog
      .getByLabel(/checked every change/)
      .first()
      .check();
    await dialog.getByLabel(/Password/).fill('not the password');
    await dialog.getByRole('button', { name: /^Sign and release/ }).click();
    await dialog.getByText(/Not the password/).waitFor();
    expect(
      await dialog
        .getByLabel(/checked every change/)
        .first()
        .isChecked(),
    ).toBe(true);
    await dialog.getByLabel(/Password/).fill(demoPassword);
    await dialog.getByRole('button', { name: /^Sign and release/ }).click();
    await dialog.waitFor({ state: 'hidden' });
    const { rows } = await pool.query(
      `select number, status from sequence_revisions where sequence_id = $1 order by number desc limit 2`,
      [sequence],
    );
    expect(rows.map(({ status }) => status)).toEqual(['released', 'superseded']);
  });

  it('is taken by the next lot, while the open lot keeps the revision it pinned', async () => {
    await inBrowser(quality, '/lots/new');
    await quality.getByLabel('Lot number').fill('9901-A');
    const basis = quality.getByLabel('Board type and released sequence');
    await basis.selectOption({ label: 'CB1210 r3, CB1210 cutoff trim' });
    await quality.getByRole('textbox', { name: 'First serial number' }).fill('CB1210990100001');
    await quality.getByLabel('Quantity').fill('5');
    await quality.getByRole('button', { name: /Make the lot/ }).click();
    await quality.waitForURL(/\/lots\/9901-A/);
    const { rows } = await pool.query(
      `select l.code, r.number from lots l join sequence_revisions r on r.id = l.sequence_revision_id
       where r.sequence_id = $1 and (l.code = '9901-A' or l.code like '%-02') order by l.code`,
      [sequence],
    );
    const numberOf = (end: string) => rows.find(({ code }) => code.endsWith(end))!.number as number;
    expect(numberOf('9901-A')).toBe(numberOf('-02') + 1);
  });

  it('leaves a history that tells the story, from which an older revision is restored as a new draft', async () => {
    await inBrowser(writer, `/sequences/${sequence}`);
    const history = await writer.locator('main').innerText();
    for (const words of ['Four repeats show a scratchy wiper', 'A. Boyle', 'T. Marsden'])
      expect(history).toContain(words);
    await findNothing(writer);
    await writer.getByRole('button', { name: 'Restore as a new draft' }).first().click();
    await writer.waitForURL(/\/draft/);
    await writer.getByText(/Draft/).first().waitFor();
    const { rows } = await pool.query(
      `select d.number, b.status as from_status from sequence_revisions d join sequence_revisions b on b.id = d.based_on_id
       where d.sequence_id = $1 and d.status = 'draft'`,
      [sequence],
    );
    expect(rows[0]).toMatchObject({ from_status: 'superseded' });
  });
});

describe('two editors of one draft', () => {
  it('are told of each other, and neither loses text', async () => {
    const other = await signInAtDesk(browser, product.url, emailOf('K. Osei'));
    await Promise.all([inBrowser(writer, draft()), inBrowser(other, draft())]);
    await writer.getByText(/K\. Osei has this draft open/).waitFor({ timeout: 15_000 });
    await typeInto(writer, 'Repeats', '6');
    await typeInto(other, 'Current limit, A', '0.35');
    const saved = () =>
      pool.query(
        `select string_agg(coalesce(step ->> 'repeats', step ->> 'currentLimitAmps'), ' ' order by step ->> 'kind') as values
         from sequence_revisions, jsonb_array_elements(data -> 'steps') step
         where sequence_id = $1 and status = 'draft' and step ->> 'kind' in ('verify', 'power-up')`,
        [sequence],
      );
    await expect.poll(async () => (await saved()).rows[0].values, { timeout: 20_000 }).toBe('0.35 6');
    await other.close();
  });
});

describe('a board type', () => {
  it('shows what its parts make of its limits, and a narrower limit waits for quality', async () => {
    await inBrowser(writer, '/board-types/CB1210');
    await writer.getByText('Predicted over trimmer travel').waitFor();
    await findNothing(writer);
    await writer.getByRole('button', { name: 'Begin a draft' }).click();
    await writer.getByRole('button', { name: /Save the draft/ }).waitFor();
    const release = writer.getByLabel(/Release point, at most|Release point at most/).first();
    await release.fill('12.2');
    await writer.getByText(/Limits cannot be met/).waitFor({ timeout: 20_000 });
    await findNothing(writer);
  });
});
