import type { Browser, Page } from 'playwright-core';
import { Server, type Namespace, type Socket } from 'socket.io';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { benchNamespace, type BenchCommand, type CommandReply } from '@/lib/contracts/bench-command';
import type { BenchReading, BenchView } from '@/lib/contracts/bench-view';
import { launchChromium } from './chromium';
import { serveGallery } from './gallery/serve';
import { practiceHands } from './gallery/samples';
import { galleryViews } from './gallery/views';

/** The bench in the browser against a real socket whose other end the test holds: losses, roles, floods, scanner. */

let browser: Browser;
let page: Page;
let gallery: Awaited<ReturnType<typeof serveGallery>>;
let io: Server;
let bench: Namespace;
let revision = 0;
let commands: BenchCommand[] = [];
let answer: CommandReply = { ok: true };
let shown: BenchView;
let leads = true;

const view = (name: string): BenchView => galleryViews[name]!.view;
function send(next: BenchView) {
  shown = { ...next, revision: ++revision };
  bench.emit('view', shown);
}
const reading = (volts: number): BenchReading => ({ volts, output: 'on', rail: 'falling' });

beforeAll(async () => {
  gallery = await serveGallery();
  io = new Server(gallery.httpServer, { pingInterval: 1000, pingTimeout: 2000 });
  bench = io.of(benchNamespace);
  bench.on('connection', (socket: Socket) => {
    socket.emit('role', { leads });
    socket.emit('view', shown);
    socket.emit('hands', practiceHands);
    socket.on('command', (command: BenchCommand, reply: (given: CommandReply) => void) => {
      commands.push(command);
      reply(answer);
    });
  });
  browser = await launchChromium();
}, 180_000);
afterAll(async () => {
  await browser?.close();
  io?.disconnectSockets(true);
  await gallery?.close();
});
beforeEach(async () => {
  await page?.close();
  [commands, answer, leads] = [[], { ok: true }, true];
  send(view('02-idle'));
  page = await browser.newPage({ viewport: { width: 1920, height: 1080 } });
  await page.goto(`${gallery.address}?screen=live`);
  await page.getByRole('heading', { name: 'Scan a board' }).waitFor();
});

const body = () => page.evaluate(() => document.body.innerText);

describe('the connection', () => {
  it('shows the newest view and drops an older one', async () => {
    send(view('03-pass'));
    await page.getByRole('heading', { name: 'PASS' }).waitFor();
    bench.emit('view', { ...view('02-idle'), revision: revision - 1 });
    await page.waitForTimeout(200);
    expect(await body()).toContain('PASS');
  });

  it('is obviously lost after two seconds without a word, and comes back by itself', async () => {
    const lost = page.locator('[data-part=lost]');
    await page.context().setOffline(true);
    for (const socket of await bench.fetchSockets()) socket.disconnect(true);
    const began = Date.now();
    await lost.waitFor();
    expect(Date.now() - began).toBeLessThan(4000);
    const box = (await lost.boundingBox())!;
    expect(box.width).toBeGreaterThan(1500);
    await page.context().setOffline(false);
    await lost.waitFor({ state: 'detached', timeout: 15_000 });
  });

  it('sends nothing later that was pressed while it was lost', async () => {
    await page.context().setOffline(true);
    for (const socket of await bench.fetchSockets()) socket.disconnect(true);
    await page.locator('[data-part=lost]').waitFor();
    await page.getByRole('button', { name: 'End shift' }).click();
    await page.getByText('No connection to the station. Try again.').waitFor();
    await page.context().setOffline(false);
    await page.locator('[data-part=lost]').waitFor({ state: 'detached', timeout: 15_000 });
    await page.waitForTimeout(500);
    expect(commands).toEqual([]);
  });

  it('survives a reload', async () => {
    send(view('a1-first-beep'));
    await page.getByRole('heading', { name: 'Clockwise' }).waitFor();
    await page.reload();
    await page.getByRole('heading', { name: 'Clockwise' }).waitFor();
  });

  it('gives a watching screen no actions and no simulated hands', async () => {
    bench.emit('role', { leads: false });
    await page.getByText('This screen watches.').waitFor();
    expect(await page.getByRole('button', { name: 'End shift' }).count()).toBe(0);
    expect(await page.getByText('Practice bench').count()).toBe(0);
  });
});

interface FloodTimes {
  heard: number;
  flooded: number;
  gone: number;
}

/** Notes, inside the page, when a message with the beep was read and when the flood came and went. */
const watchFloods = () =>
  page.evaluate(() => {
    const floods: FloodTimes[] = [];
    Object.assign(window, { floods });
    const data = Object.getOwnPropertyDescriptor(MessageEvent.prototype, 'data')!;
    Object.defineProperty(MessageEvent.prototype, 'data', {
      get() {
        const text: unknown = data.get!.call(this);
        if (typeof text === 'string' && text.includes('beep-1-heard'))
          floods.push({ heard: performance.now(), flooded: 0, gone: 0 });
        return text;
      },
    });
    new MutationObserver(() => {
      const last = floods.at(-1);
      if (!last) return;
      if (document.querySelector('[data-flood]')) last.flooded ||= performance.now();
      else if (last.flooded) last.gone ||= performance.now();
    }).observe(document.body, { childList: true, subtree: true });
  });

describe('the flood of a beep', () => {
  it('fills the screen within 60 ms of the view, and stays 1.5 s though the reading is done', async () => {
    send(view('a1-first-beep'));
    await page.getByRole('heading', { name: 'Clockwise' }).waitFor();
    await watchFloods();
    const flood = page.locator('[data-flood]');
    for (let i = 0; i < 3; i++) {
      send(view('a2-flood'));
      await flood.waitFor();
      await page.waitForTimeout(200);
      send(view('a3-second-beep'));
      await flood.waitFor({ state: 'detached' });
      await page.waitForTimeout(1300);
    }
    const floods = await page.evaluate(() => (window as unknown as { floods: FloodTimes[] }).floods);
    const seen = floods.filter(({ flooded }) => flooded > 0);
    // The quickest of three: the others also tell how busy this computer is.
    expect(Math.min(...seen.map(({ heard, flooded }) => flooded - heard))).toBeLessThan(60);
    for (const { flooded, gone } of seen) expect(gone - flooded).toBeGreaterThanOrEqual(1500);
  });
});

describe('the live supply', () => {
  it('moves the dot with the readings', async () => {
    send(view('measuring'));
    await page.getByText('Finding both points').waitFor();
    const place = () => page.locator('[data-part=supply-dot]').getAttribute('transform');
    bench.emit('reading', reading(12));
    await expect.poll(place).toMatch(/^translate\(224/);
    const high = await place();
    bench.emit('reading', reading(10.9));
    await expect.poll(place).not.toBe(high);
    expect(await body()).toContain('10.90');
  });
});

describe('the scanner', () => {
  it('sends one scan, whatever has the focus, and shows why it was refused', async () => {
    answer = { ok: false, code: 'no-bin-needed' };
    await page.getByRole('button', { name: 'Enter by hand' }).click();
    await page.keyboard.type('SWN-R3');
    await page.keyboard.press('Enter');
    await expect.poll(() => commands).toEqual([{ kind: 'scan', text: 'SWN-R3' }]);
    expect(await page.getByLabel('Serial number', { exact: true }).inputValue()).toBe('');
    await page.getByText('No board waits for a bin.').waitFor();
  });

  it('stops on Escape', async () => {
    send(view('a1-first-beep'));
    await page.getByRole('heading', { name: 'Clockwise' }).waitFor();
    await page.keyboard.press('Escape');
    await expect.poll(() => commands).toEqual([{ kind: 'stop' }]);
  });
});

describe('the practice bench', () => {
  it('covers none of the actions at 1920 × 1080', async () => {
    send(view('a1-first-beep'));
    await page.getByRole('heading', { name: 'Clockwise' }).waitFor();
    const tray = (await page.locator('aside').boundingBox())!;
    for (const name of ['Will not turn', 'End test', 'Menu']) {
      const box = (await page.getByRole('button', { name }).boundingBox())!;
      expect(box.x + box.width, name).toBeLessThanOrEqual(tray.x);
      expect(box.y + box.height, name).toBeLessThanOrEqual(1080);
      if (name !== 'Menu') expect(box.height, name).toBeGreaterThanOrEqual(99.5);
    }
  });
});
