import { chromium, type Browser } from 'playwright-core';

/** Debian's Chromium without a window, with nothing that reaches for the network. */
export function launchChromium(): Promise<Browser> {
  return chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--headless',
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
    timeout: 60_000,
  });
}
