import type { Browser, Page } from 'playwright-core';
import { demoPassword } from '@/db/seed/demo-accounts';

/** A new window at a desk, signed in with a demo account. */
export async function signInAtDesk(browser: Browser, url: string, email: string): Promise<Page> {
  const desk = await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage();
  await desk.goto(`${url}/sign-in`);
  await desk.getByLabel('E-mail').fill(email);
  await desk.getByLabel('Password').fill(demoPassword);
  await desk.getByRole('button', { name: 'Sign in' }).click();
  await desk.waitForURL((address) => !address.pathname.startsWith('/sign-in'));
  return desk;
}
