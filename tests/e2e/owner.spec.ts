import { expect, test } from '@playwright/test';
import { complaintsOf, expectSoundPage } from './page-checks.ts';

test('an owner finds a misspelled boat, reads its sheet and sees what the motor hides', async ({ page }) => {
  const complaints = complaintsOf(page);
  await page.goto('/');
  await expectSoundPage(page);
  await page.getByRole('searchbox').fill('redcuter 14');
  const finding = page.getByRole('link', { name: /Reedcutter 14.*2016/ });
  await expect(finding).toBeVisible();
  await expectSoundPage(page);
  await finding.click();

  await expect(page.getByRole('heading', { level: 1, name: /Reedcutter 14/ })).toBeVisible();
  await expect(page.getByRole('heading', { level: 2, name: 'Running trim' })).toBeVisible();
  await expect(page.getByRole('img', { name: /6 measured points/ })).toBeVisible();
  await expectSoundPage(page);
  await page.getByRole('link', { name: 'Check a fit' }).last().click();

  await expect(page).toHaveURL(/\/fit\?.*hull=hul_/);
  const drawing = page.getByRole('img', { name: /from astern/i }).first();
  await expect(drawing).toBeVisible();
  await expect(page.getByText(/port side/i).first()).toBeVisible();
  await expect(page.getByText(/% clear|all clear/).first()).toBeVisible();
  await expect(page.getByText(/nose-(up|down).*\(heel-(up|down)/).first()).toBeVisible();
  await expect(page.getByText(/an estimate, not an approval/i).first()).toBeVisible();
  await expectSoundPage(page);
  expect(complaints).toEqual([]);
});

test('the same address in a clean browser gives the same answer', async ({ page, browser }) => {
  await page.goto('/fit');
  await expect(page.getByText(/% clear/).first()).toBeVisible();
  await page.goto(`${page.url().split('?')[0]}?${new URLSearchParams({ motorTrimDeg: '6', offsetMm: '420' })}`);
  await expect(page.getByText(/% clear|all clear/).first()).toBeVisible();
  const answer = async (at: typeof page) => (await at.getByRole('heading', { level: 2 }).allTextContents()).join('\n');
  const mine = await answer(page);
  const clean = await (await browser.newContext({ viewport: page.viewportSize() })).newPage();
  await clean.goto(page.url());
  await expect(clean.getByText(/% clear|all clear/).first()).toBeVisible();
  expect(await answer(clean)).toBe(mine);
  await clean.context().close();
});

test('keys alone: from the field through the findings to the boat', async ({ page }) => {
  await page.goto('/');
  await page.getByRole('searchbox').focus();
  await page.keyboard.type('copperplat');
  await expect(page.getByText('One boat found')).toBeAttached();
  await expect(page.getByRole('link', { name: /Copperplate 670/ })).toBeVisible();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { level: 1, name: /Copperplate 670/ })).toBeVisible();
});

test('nothing found leads on; an address that is none says so', async ({ page }) => {
  await page.goto('/');
  await page.getByRole('searchbox').fill('xqzzkv');
  await expect(page.getByText(/no boat|nothing/i).first()).toBeVisible();
  await page
    .getByRole('link', { name: /not listed/i })
    .first()
    .click();
  await expect(page).toHaveURL(/\/fit/);
  await page.goto('/no/such/page');
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(/nothing at this address/i);
  await expectSoundPage(page);
});
