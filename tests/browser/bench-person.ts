import type { Page } from 'playwright-core';

export interface Tested {
  serial: string;
  verdict: 'pass' | 'reject' | 'no-verdict';
  /** What the screen said, one line a sentence. */
  words: string;
}

const big = { pass: 'PASS', reject: 'REJECT', scan: 'Scan a board' };

/** A person at a simulated bench: reads the screen, moves the simulated hands, scans with a scanner that types. */
export class BenchPerson {
  constructor(readonly page: Page) {}

  static async standAt(page: Page, url: string, stationName: string): Promise<BenchPerson> {
    await page.goto(`${url}/bench`);
    await page.getByRole('button', { name: `Stand at ${stationName}` }).click();
    const another = page.getByRole('button', { name: 'Another badge' });
    await page.getByText('Scan your badge').or(another).first().waitFor();
    if (await another.isVisible()) await another.click();
    await page.getByText('Scan your badge').waitFor();
    return new BenchPerson(page);
  }

  text(): Promise<string> {
    return this.page.evaluate(() => document.body.innerText);
  }

  /** As a keyboard scanner does: fast keys, then Enter, whatever has the focus. Sent inside the page, so that a busy machine does not slow them to a person's pace. */
  async scan(code: string): Promise<void> {
    await this.page.evaluate(
      (keys) => {
        for (const key of keys) {
          const target = document.activeElement ?? document.body;
          target.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
        }
      },
      [...code, 'Enter'],
    );
  }

  async signIn(badgeNumber: string, pin: string): Promise<void> {
    await this.scan(`SWB-${badgeNumber}`);
    await this.page.getByText('0 of 4 digits typed.').waitFor();
    for (const digit of pin) await this.page.keyboard.press(digit, { delay: 60 });
    // Enter is a scanner's too: a person waits before pressing it.
    await this.page.waitForTimeout(400);
    await this.page.keyboard.press('Enter');
    await this.page.getByText('Scan the lot sheet').waitFor();
  }

  async takeLot(code: string): Promise<void> {
    await this.scan(`SWL-${code}`);
    await this.page.getByText(big.scan).waitFor();
  }

  press(name: string | RegExp): Promise<void> {
    return this.page.getByRole('button', { name }).first().click();
  }

  /** Presses a button only when it can be pressed now. */
  private async pressIfThere(name: string | RegExp): Promise<boolean> {
    const button = this.page.getByRole('button', { name }).first();
    if (!(await button.isVisible())) return false;
    return button.click({ timeout: 1000 }).then(
      () => true,
      () => false,
    );
  }

  private async emptyFixture(): Promise<void> {
    const emptied = this.page.getByRole('button', { name: /^Place / }).first();
    for (let tries = 0; tries < 50 && !(await emptied.isVisible()); tries += 1) {
      if (!(await this.pressIfThere('Open lid'))) await this.pressIfThere('Remove board');
      await this.page.waitForTimeout(60);
    }
    await this.page.getByRole('button', { name: 'Close lid' }).waitFor();
  }

  /** Takes the next board of the lot through the bench, doing at each screen what it asks. `onScreen` may take pictures. */
  async testNextBoard(onScreen: (words: string) => Promise<void> = async () => {}): Promise<Tested> {
    await this.emptyFixture();
    // A board may follow an idle screen or a pass.
    await this.page
      .getByText(/Scan a board|Scan the next one/)
      .first()
      .waitFor();
    await this.press(/^Place /);
    await this.page.getByRole('button', { name: 'Remove board' }).waitFor();
    const scanIt = this.page.getByRole('button', { name: /^Scan [A-Z0-9]/ }).first();
    await scanIt.click();
    let serial = '';
    const deadline = Date.now() + 90_000;
    await this.page.getByText(/PASS|REJECT|is not judged/).waitFor({ state: 'hidden' });
    while (Date.now() < deadline) {
      const words = await this.text();
      await onScreen(words);
      serial = /Board: (\d+)/.exec(words)?.[1] ?? serial;
      if (words.includes(big.pass)) {
        await this.emptyFixture();
        return { serial, verdict: 'pass', words };
      }
      if (words.includes(big.reject)) {
        const bin = /Scan the label on bin (\S+)/.exec(words)?.[1];
        if (!bin) continue;
        await this.emptyFixture();
        await this.scan(`SWN-${bin}`);
        await this.page.getByText('waiting for the bin scan').waitFor({ state: 'hidden' });
        return { serial, verdict: 'reject', words };
      }
      if (words.includes('is not judged')) {
        await this.emptyFixture();
        return { serial, verdict: 'no-verdict', words };
      }
      await this.doWhatIsAsked(words);
      await this.page.waitForTimeout(60);
    }
    throw new Error(`Board ${serial} was not finished in 90 s. The screen says:\n${await this.text()}`);
  }

  private async doWhatIsAsked(words: string): Promise<void> {
    if (words.includes('You may open the lid')) await this.pressIfThere('Open lid');
    else if (words.includes('Seal the screw')) await this.pressIfThere('Screw is sealed');
    else if (words.includes('Close the lid')) await this.pressIfThere('Close lid');
    else if (words.includes('Look at the board, then answer.')) await this.pressIfThere('Yes');
    else if (words.includes('Will not turn')) await this.pressIfThere('Turn as prompted');
  }
}
