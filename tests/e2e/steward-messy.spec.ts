import { expect, type Page, test } from '@playwright/test';
import { complaintsOf, expectSoundPage, signIn } from './page-checks.ts';

/** A builder's own list: title rows, own words, feet and inches beside metres, two sizes in one cell, years in one cell, no maker. */
const messy = [
  'Boats of the yard;;;;;;',
  'Spring list, all sizes as built;;;;;;',
  'Boat model;Size (L x B);Years made;Vee angle;Transom height (in);Shape;Dealer',
  'Dabchick 12;12\' 2" x 4\' 9";2016-20;3;15;flat;Mill Lane',
  'Dabchick 14;4.27 m x 1.55 m;2016-20;4;15;flat;Mill Lane',
  'Dabchick 15;15\' 1" x 6\' 3";2015-18;12°;20;shallow v;Quay',
  'Dabchick 16;16\' 8" x 6\' 7";2019+;15;20;modified v;Quay',
  'Dabchick 17;17\' 1" x 6\' 11";2019+;17;20;semi-vee;Quay',
  "Dabchick 18;18' x 7' 3\";2019+;18;508 mm;semi-vee;Quay",
  'Dabchick 19;5.8 m x 2.3 m;2020+;19;20;semi-vee;Quay',
  'Dabchick 16;16\' 8" x 6\' 7";2019+;15;20;modified v;Quay',
  "Dabchick 20;20' x 8';2021;steep;25;deep v;Harbour Row",
  'Dabchick 21;21\' 4" x 8\' 2";2021+;21;25;deep v;Harbour Row',
  "Dabchick 22;22' x 8' 4\";2018-22;22;25;deep v;Harbour Row",
  'Dabchick 23;7 m x 2.5 m;2018-22;22;25;deep v;Harbour Row',
  "Dabchick 24;24' x 8' 6\";2022+;23;635mm;deep v;Harbour Row",
  "Dabchick P;20' x 8' 2\";2014-2017;;20;pontoon;Mill Lane",
  "Dabchick C;19' 6\" x 8';2017+;;25;catamaran;Mill Lane",
].join('\n');

async function upload(page: Page, dealerHeading: string): Promise<void> {
  await page.goto('/steward');
  await page.getByLabel('Table', { exact: true }).selectOption('hulls');
  await page
    .getByLabel('File')
    .setInputFiles({ name: 'yard list.csv', mimeType: 'text/csv', buffer: Buffer.from(messy.replace('Dealer', dealerHeading)) });
  await page.getByRole('button', { name: 'Upload and check' }).click();
}

test('a builder’s messy list is mapped, mended, published, compared and rolled back', async ({ page }, info) => {
  // Each size publishes boats of its own: both run against one server.
  const maker = info.project.name === 'phone' ? 'Thornwick' : 'Saltmere';
  // How a file is read is remembered by its headings.
  const dealer = info.project.name === 'phone' ? 'Dealer' : 'Sold by';
  const complaints = complaintsOf(page);
  await signIn(page, 'steward');
  await upload(page, dealer);

  // Where the headings stand and what the columns hold is suggested; the maker is asked for.
  await expect(page.getByRole('heading', { name: 'What does each column hold?' })).toBeVisible();
  await expect(page.getByRole('radio', { name: /row 3/ })).toBeChecked();
  const size = page.getByRole('group', { name: 'Size (L x B)' });
  await expect(size.getByLabel('First value')).toHaveValue('length_m');
  await expect(size.getByLabel('Second value')).toHaveValue('beam_m');
  await expect(page.getByRole('group', { name: 'Transom height (in)' }).getByLabel('Unit of bare numbers')).toHaveValue('in');
  await expect(page.getByRole('group', { name: dealer }).getByLabel('Holds')).toHaveValue('');
  await expect(page.getByText(/Nothing fills maker/)).toBeVisible();
  await expect(page.getByText(/“semi-vee”/).first()).toBeVisible();
  await expectSoundPage(page);

  // Another row of headings is tried, and the right one taken again.
  await page.getByRole('radio', { name: /row 4/ }).check();
  await expect(page.getByRole('group', { name: 'Dabchick 12' })).toBeVisible();
  await page.getByRole('radio', { name: /row 3/ }).check();
  await expect(size).toBeVisible();

  const kept = page.waitForResponse(
    (answer) => answer.request().method() === 'PUT' && answer.request().postData()?.includes(maker) === true,
  );
  await page.getByLabel('Maker', { exact: true }).fill(maker);
  await kept;
  await expect(page.getByText(/Nothing fills/)).toBeHidden();
  // What is chosen is kept: a reload brings it back.
  await page.reload();
  await expect(page.getByLabel('Maker', { exact: true })).toHaveValue(maker);
  await page.getByRole('button', { name: 'Check the rows' }).click();

  // 15 rows: one twice, three with a shape nobody knows, one with words for a number.
  await expect(page.getByText('10 new records to publish.')).toBeVisible();
  await expect(page.getByText('5 rows are left out: 4 wrong, 1 twice in the file.')).toBeVisible();
  await expectSoundPage(page);

  await page.getByRole('link', { name: /^wrong/ }).click();
  const shape = page.getByLabel(/Row 8, Form/);
  await expect(shape).toHaveValue('semi-vee');
  await shape.fill('modified-v');
  await page
    .getByLabel(/every other cell here that reads “semi-vee”/)
    .first()
    .check();
  await shape.press('Enter');
  await expect(page.getByText('Form: “semi-vee” is read as “modified-v” now, in 3 rows.')).toBeFocused();
  const angle = page.getByLabel(/Row 12, Deadrise/);
  await angle.fill('20');
  await angle.press('Enter');
  await expect(page.getByText('Mended: row 12 is new now.')).toBeFocused();
  await expect(page.getByText('14 new records to publish.')).toBeVisible();
  await expectSoundPage(page);

  // Two flat boats have an unusual angle: one is looked at and ticked, the other waits. One row is left out by word.
  await page.getByRole('link', { name: /^new/ }).click();
  await page.getByLabel(/row 4 is right as it stands/).check();
  await expect(page.getByText('Row 4 will be published as it is.')).toBeVisible();
  await page.getByRole('button', { name: /Leave it out ?, row 18/ }).click();
  await expect(page.getByText('Row 18 is left out.')).toBeVisible();

  await page.getByRole('button', { name: 'Publish …' }).click();
  const dialog = page.getByRole('dialog', { name: 'Publish this table?' });
  await dialog.getByLabel('Why?').fill(`Spring list of ${maker}`);
  await dialog.getByRole('button', { name: 'Publish' }).click();
  await expect(page.getByText('12 records reached the catalog and can be found by name now.')).toBeVisible();

  await page.getByRole('link', { name: /What edition \d+ changed/ }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Editions' })).toBeVisible();
  // 18 ft = 5.49 m; 508 mm stands in the file as such; the mended shape.
  const eighteen = page.getByRole('row', { name: new RegExp(`${maker} Dabchick 18`) });
  await expect(eighteen).toContainText('5.49 m');
  await expect(eighteen).toContainText('508 mm');
  await expect(eighteen).toContainText('modified vee');
  await expect(page.getByRole('row', { name: /Dabchick C/ })).toHaveCount(0);
  await expectSoundPage(page);

  const download = page.waitForEvent('download');
  await page.getByRole('link', { name: 'Download hulls as CSV' }).click();
  expect((await download).suggestedFilename()).toMatch(/^hulls-edition-\d+\.csv$/);

  // Taking it back wants a reason and a second word.
  await page
    .getByRole('row', { name: new RegExp(`Spring list of ${maker}`) })
    .getByRole('button', { name: /^Roll back/ })
    .click();
  const rollBack = page.getByRole('dialog', { name: /Roll back edition \d+\?/ });
  await rollBack.getByRole('button', { name: 'Roll back', exact: true }).click();
  await expect(rollBack.getByText('Say in a few words why.')).toBeVisible();
  await rollBack.getByLabel('Why?').fill('The yard took its list back');
  await rollBack.getByRole('button', { name: 'Roll back', exact: true }).click();
  await expect(rollBack.getByText(/Tick this as well/)).toBeVisible();
  await rollBack.getByLabel(/Yes, take back/).check();
  await rollBack.getByRole('button', { name: 'Roll back', exact: true }).click();
  await expect(page.getByText(/12 of them, which it had first published, are withdrawn/)).toBeVisible();
  await expect(page.getByText('The yard took its list back').first()).toBeVisible();

  await page.goto(`/?q=${maker}`);
  await expect(page.getByRole('main')).toBeVisible();
  await expect(page.getByRole('link', { name: new RegExp(`${maker}.*Dabchick`) })).toHaveCount(0);

  // The same headings come again: their reading is offered, the maker with it.
  await upload(page, dealer);
  await expect(page.getByText(/A file with these headings came before/)).toBeVisible();
  await expect(page.getByLabel('Maker', { exact: true })).toHaveValue(maker);
  expect(complaints).toEqual([]);
});

test('editions are the steward’s: a visitor signs in, a customer reads why not', async ({ page }) => {
  await page.goto('/steward/editions');
  await expect(page.getByRole('main').getByRole('link', { name: 'Sign in' })).toBeVisible();
  await expectSoundPage(page);
  await signIn(page, 'customer');
  await page.goto('/steward/editions?from=x&to=2');
  await expect(page.getByText(/may not do this/i)).toBeVisible();
  await expectSoundPage(page);
});

test('a comparison that makes no sense is refused in words', async ({ page }) => {
  await signIn(page, 'steward');
  await page.goto('/steward/editions?from=x&to=2');
  await expect(page.getByRole('alert')).toHaveText(/two whole numbers/);
  await page.getByLabel('From edition').fill('0');
  await page.getByRole('button', { name: 'Compare' }).click();
  await expect(page.getByText(/From edition 0 to edition/).or(page.getByText(/There is no edition 2/))).toBeVisible();
});
