import type { Page } from 'playwright-core';
import type { ConsoleService } from './consoleService';
import { PASSWORD } from './consoleService';
import type { ReceivedMail } from './TestMailServer';

/** What people do in the console, by the names that they see. */
export const field = (page: Page, name: string) => page.getByRole('textbox', { name, exact: true });
export const button = (page: Page, name: string) => page.getByRole('button', { name, exact: true });
export const heading = (page: Page, name: string) => page.getByRole('heading', { name, exact: true });
/** Password fields have no role; they are found by their label. */
export const secret = (page: Page, name: string) => page.getByLabel(name, { exact: true });

/** The sentences that stand at a field, tied to it. */
export async function faultsAt(page: Page, name: string): Promise<string> {
  const control = page.getByLabel(name, { exact: true });
  if ((await control.getAttribute('aria-invalid')) !== 'true') return '';
  const ids = ((await control.getAttribute('aria-describedby')) ?? '').split(' ');
  const texts = await Promise.all(ids.map((id) => page.locator(`[id="${id}"]`).textContent()));
  return texts.join(' ');
}

export async function signIn(page: Page, email: string, password = PASSWORD): Promise<void> {
  await page.goto('/sign-in');
  await field(page, 'E-mail address').fill(email);
  await secret(page, 'Password').fill(password);
  await button(page, 'Sign in').click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}

/** Opens a mail as its reader would, and follows its link. */
export async function followMail(page: Page, mail: ReceivedMail, link: string): Promise<void> {
  await page.goto('about:blank');
  await page.setContent(mail.html);
  await page.getByRole('link', { name: link, exact: true }).click();
  await page.locator('main h1').waitFor();
}

/** An account without a session, whose owner has yet to sign in. */
export async function accountOf(
  service: ConsoleService,
  options: Parameters<ConsoleService['person']>[0] = {},
): Promise<{ id: string; email: string }> {
  const { id, email, browser } = await service.person(options);
  await browser.call('DELETE', '/api/session');
  return { id, email };
}

/** Presses Tab until the control of that name has the focus. */
export async function tabTo(page: Page, name: string): Promise<void> {
  for (let i = 0; i < 60; i++) {
    await page.keyboard.press('Tab');
    const label = await page.evaluate(() => {
      const focused = document.activeElement as HTMLInputElement | null;
      return focused?.getAttribute('aria-label') ?? (focused?.labels?.[0] ?? focused)?.textContent.trim();
    });
    if (label === name) return;
  }
  throw new Error(`${name} is not reached by Tab`);
}
