import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { Pool } from 'pg';
import { demoAccounts } from '@/db/seed/demo-accounts';
import type { DefectKind } from '@/lib/contracts/bench-command';
import type { RejectReason } from '@/lib/run/types';
import { BenchPerson, type Tested } from './bench-person';
import { launchChromium } from './chromium';
import { signInAtDesk } from './desk-person';
import { startProduct, type Product } from './product';

/** What each defect of the demo lot must be rejected for; the signature table of the trade, common practice, no source. */
const reasonOf: Partial<Record<DefectKind, RejectReason>> = {
  'feedback-open': 'output-chatters',
  'wrong-zener': 'reference-out-of-limits',
  'reservoir-missing': 'ride-through',
  'op-amp-missing': 'never-on',
  'wiper-open': 'trim-no-effect',
  'supply-short': 'supply-current-at-limit',
  'zener-open': 'reference-out-of-limits',
};

interface Row {
  serial: string;
  defect: DefectKind;
  verdict: string | null;
  reason: RejectReason | null;
  off: boolean | null;
  events: number;
}

let product: Product;
let browser: Browser;
let page: Page;
let pool: Pool;
let lot: string;

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(), launchChromium()]);
  pool = new Pool({ connectionString: product.databaseUrl, max: 2 });
  lot = (await pool.query(`select code from lots where code like '%-01'`)).rows[0].code;
  page = await (await browser.newContext({ viewport: { width: 1920, height: 1080 } })).newPage();
});
afterAll(async () => {
  await pool?.end();
  await browser?.close();
  await product?.stop();
});

describe('a demo lot of 24 boards with seven defects, at the bench', () => {
  const tested: Tested[] = [];

  it(
    'takes every board to the verdict and reason that its parts deserve',
    { timeout: process.env.SILLWRIGHT_NIGHTLY ? 3_600_000 : 600_000 },
    async () => {
      const operator = demoAccounts.find((account) => account.roles.includes('operator') && account.badgeNumber)!;
      const person = await BenchPerson.standAt(page, product.url, 'Station 1');
      await person.signIn(operator.badgeNumber!, operator.pin!);
      await person.takeLot(lot);
      for (let board = 1; board <= 24; board += 1) tested.push(await person.testNextBoard());

      const { rows } = await pool.query<Row>(
        `select u.serial, s.defect, r.verdict, r.reject_reason as reason, r.supply_off_confirmed as off,
         (select count(*)::int from run_events e where e.run_id = r.id) as events
       from units u join lots l on l.id = u.lot_id join simulated_boards s on s.serial = u.serial
       left join runs r on r.unit_id = u.id where l.code = $1 order by u.position, r.started_at`,
        [lot],
      );
      expect(rows).toHaveLength(24);
      const expected = rows.map(({ serial, defect }) => ({
        serial,
        defect,
        verdict: defect === 'none' ? 'pass' : 'reject',
        reason: defect === 'none' ? null : reasonOf[defect],
      }));
      expect(rows.map(({ serial, defect, verdict, reason }) => ({ serial, defect, verdict, reason }))).toEqual(
        expected,
      );
      expect(rows.every((row) => row.off && row.events > 0)).toBe(true);
      expect(tested.map((board) => board.verdict)).toEqual(expected.map((row) => row.verdict));
    },
  );

  it('shows the lot and its boards at the desk', async () => {
    const quality = demoAccounts.find((account) => account.roles.includes('quality-manager'))!;
    const desk = await signInAtDesk(browser, product.url, quality.email!);
    await desk.goto(`${product.url}/lots/${lot}`);
    const words = await desk.locator('main').innerText();
    expect(words).toMatch(/17\s+of\s+24\s+boards\s+passed/);
    const rejected = tested.find((board) => board.verdict === 'reject')!;
    await desk
      .getByRole('link', { name: new RegExp(rejected.serial) })
      .first()
      .click();
    await desk.getByText('Rejected').first().waitFor();
    expect(await desk.locator('main').innerText()).toContain(rejected.serial);
  });
});
