import { expect, test } from '@playwright/test';
import { complaintsOf, expectSoundPage, signIn } from './page-checks.ts';

test('a steward uploads a table with two new rows and a wrong one, publishes it, and the hull is found', async ({ page }, info) => {
  // Each size publishes boats of its own: both run against one server.
  const maker = info.project.name === 'phone' ? 'Alderwick' : 'Brackenford';
  const table = [
    'maker,model,form,length_m,beam_m,deadrise_deg,transom_angle_deg',
    `${maker},Moorhen 46,modified-v,4.6,1.9,17,13`,
    `${maker},Moorhen 52,modified-v,17' 1",2.1,18,13`,
    `${maker},Moorhen 60,modified-v,6.0,2.3,steep,13`,
  ].join('\n');
  const complaints = complaintsOf(page);
  await signIn(page, 'steward');
  await page.goto('/steward');
  await expectSoundPage(page);
  await page.getByLabel('Table', { exact: true }).selectOption('hulls');
  await page.getByLabel('File').setInputFiles({ name: 'hulls.csv', mimeType: 'text/csv', buffer: Buffer.from(table) });
  await page.getByRole('button', { name: /upload and check/i }).click();

  await expect(page.getByText('2 new records to publish')).toBeVisible();
  await expect(page.getByText(/1 row is left out/)).toBeVisible();
  await expectSoundPage(page);
  await page
    .getByRole('button', { name: /^wrong/ })
    .or(page.getByRole('radio', { name: /^wrong/ }))
    .or(page.getByRole('link', { name: /^wrong/ }))
    .first()
    .click();
  await expect(page.getByText(/steep/).first()).toBeVisible();
  await page.getByRole('button', { name: /^Publish/ }).click();
  const dialog = page.getByRole('dialog');
  await expect(dialog).toBeVisible();
  await dialog.getByRole('textbox').first().fill('Spring list');
  await dialog.getByRole('button', { name: /^Publish/ }).click();
  await expect(page.getByText(/edition \d+/i).first()).toBeVisible();

  await page.goto('/');
  await page.getByRole('searchbox').fill(`${maker.replace('e', '')} mooren 52`);
  await page.getByRole('link', { name: new RegExp(`${maker}.*Moorhen 52`) }).click();
  await expect(page.getByRole('heading', { level: 1, name: /Moorhen 52/ })).toBeVisible();
  expect(complaints).toEqual([]);
});

test('a picture named .csv is refused with its reason, and nothing changes', async ({ page }) => {
  await signIn(page, 'steward');
  await page.goto('/steward');
  await page.getByLabel('File').setInputFiles({
    name: 'hulls.csv',
    mimeType: 'text/csv',
    buffer: Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13]),
  });
  await page.getByRole('button', { name: /upload and check/i }).click();
  await expect(page.getByText(/is a PNG picture, not a CSV file/)).toBeVisible();
  await expect(page).toHaveURL(/\/steward$/);
});

test('a customer is told that tables are the steward’s, a visitor to sign in', async ({ page }) => {
  await page.goto('/steward');
  await expect(page.getByRole('link', { name: 'Sign in' }).last()).toBeVisible();
  await expectSoundPage(page);
  await signIn(page, 'customer');
  await page.goto('/steward');
  await expect(page.getByText(/may not do this/i)).toBeVisible();
  await expectSoundPage(page);
});
