// What holds on every page at every size.
import AxeBuilder from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

/** No serious or critical finding of axe against WCAG 2.2 AA, and nothing to scroll sideways. */
export async function expectSoundPage(page: Page): Promise<void> {
  await expect(page.getByRole('main')).toBeVisible();
  await expect(page.getByRole('heading', { level: 1 }).first()).toBeAttached();
  const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']).analyze();
  const serious = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
  expect(serious.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html.slice(0, 120)).join(' | ')}`)).toEqual([]);
  const sideways = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  expect(sideways, 'nothing scrolls sideways').toBeLessThanOrEqual(0);
}

/** Collects what the browser complains of: script errors and refusals by the content policy. */
export function complaintsOf(page: Page): string[] {
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(error.message));
  page.on('console', (message) => {
    if (message.type() === 'error' && !/status of (401|403|404|409|422|429)/.test(message.text())) complaints.push(message.text());
  });
  return complaints;
}

export async function signIn(page: Page, who: 'customer' | 'integrator' | 'steward' | 'admin'): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(`${who}@tiltwright.example`);
  await page.getByLabel('Password').fill('loft-floor-2026');
  await page.getByRole('main').getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('button', { name: 'Sign out' })).toBeVisible();
}
