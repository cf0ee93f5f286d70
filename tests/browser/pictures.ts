// Makes the pictures of the README: takes the first boards of the demo lot through a simulated bench and photographs the screens.
import { mkdirSync } from 'node:fs';
import { demoAccounts } from '@/db/seed/demo-accounts';
import { build, buildIsCurrent } from '@/server/setup/build.mjs';
import { BenchPerson } from './bench-person';
import { launchChromium } from './chromium';
import { signInAtDesk } from './desk-person';
import { startProduct } from './product';

const folder = 'tests/browser/pictures';

/** Screens worth a picture, by words that only they show; each is taken once. */
const moments: readonly [name: string, words: RegExp][] = [
  ['find-points', /Find points[\s\S]*readings/],
  ['trim-first-beep', /until it beeps/],
  ['trim-stop', /First beep\./],
  ['trim-second-beep', /^(?![\s\S]*beep\.)[\s\S]*Now slowly/],
  ['seal', /Seal the screw/],
  ['pass', /PASS/],
  ['reject', /REJECT[\s\S]*waiting for the bin scan/],
];

mkdirSync(folder, { recursive: true });
if (!buildIsCurrent()) await build();
const product = await startProduct({ clockRate: 2 });
const browser = await launchChromium();
try {
  const page = await (await browser.newContext({ viewport: { width: 1920, height: 1080 } })).newPage();
  const taken = new Set<string>();
  const take = async (name: string) => {
    if (taken.has(name)) return;
    taken.add(name);
    await page.screenshot({ path: `${folder}/${name}.png` });
    console.log(name);
  };
  const person = await BenchPerson.standAt(page, product.url, 'Station 1');
  await take('badge');
  const operator = demoAccounts.find((account) => account.badgeNumber && account.pin)!;
  await person.signIn(operator.badgeNumber!, operator.pin!);
  const lot = /\d{4}-01/.exec(await person.text())![0];
  await person.takeLot(lot);
  await take('idle');
  const serials: string[] = [];
  for (let board = 0; board < 3; board += 1) {
    const tested = await person.testNextBoard(async (words) => {
      const moment = moments.find(([name, shown]) => !taken.has(name) && shown.test(words));
      if (moment) await take(moment[0]);
    });
    serials.push(tested.serial);
  }

  const quality = demoAccounts.find((account) => account.roles.includes('quality-manager'))!;
  const desk = await signInAtDesk(browser, product.url, quality.email!);
  await desk.goto(`${product.url}/lots/${lot}`);
  await desk.getByText('of 24 boards tested').waitFor();
  await desk.screenshot({ path: `${folder}/lot.png` });
  await desk
    .getByRole('link', { name: new RegExp(serials[0]!) })
    .first()
    .click();
  await desk.getByText('Label, 40').first().waitFor();
  await desk.screenshot({ path: `${folder}/unit.png` });
  await desk.goto(`${product.url}/lots/${lot.replace(/-01$/, '-00')}`);
  await desk.getByText('boards passed first time').waitFor();
  await desk.screenshot({ path: `${folder}/review.png` });
  await desk.goto(`${product.url}/sequences`);
  await desk.getByRole('link', { name: 'CB2420 cutoff trim' }).click();
  await desk
    .getByRole('link', { name: /^Compare/ })
    .first()
    .click();
  await desk.getByText('Supply over one board').waitFor();
  await desk.screenshot({ path: `${folder}/compare.png` });

  const engineer = demoAccounts.find((account) => account.name === 'T. Marsden')!;
  const bench = await signInAtDesk(browser, product.url, engineer.email!);
  await bench.goto(`${product.url}/board-types/CB1210`);
  await bench.getByText('boards', { exact: false }).first().waitFor();
  await bench.waitForTimeout(3_000);
  await bench.screenshot({ path: `${folder}/board-type.png` });
  await bench.goto(`${product.url}/sequences`);
  await bench.getByRole('link', { name: 'CB1210 cutoff trim', exact: true }).click();
  await bench.getByRole('link', { name: 'Open the draft' }).first().click();
  await bench.getByText('Predicted supply').waitFor();
  await bench.waitForTimeout(3_000);
  await bench.screenshot({ path: `${folder}/sequence.png` });
} finally {
  await browser.close();
  await product.stop();
}
