import { expect, test } from '@playwright/test';
import { oneTimeCode } from '../support/one-time-code.ts';
import { complaintsOf, expectSoundPage, signIn } from './page-checks.ts';

/** Both sizes run against one server: each has people of its own. */
const address = (name: string, project: string) => `${name}-${project}@tiltwright.example`;

test('a newcomer signs up, follows the mail’s link, is signed in, and turns a second factor on', async ({ page }, { project }) => {
  test.slow();
  const complaints = complaintsOf(page);
  const email = address('newcomer', project.name);
  await page.goto('/sign-up?next=%2Ffit');
  await page.getByLabel('Name').fill('A newcomer');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill('twelve or more');
  await page.getByRole('button', { name: 'Make an account' }).click();
  await expect(page.getByRole('heading', { name: 'Look into your mail' })).toBeFocused();
  await expectSoundPage(page);
  await page.getByRole('link', { name: 'Read the mail' }).click();
  await expect(page.getByRole('heading', { name: 'Finish making your Tiltwright account' })).toBeVisible();
  await expectSoundPage(page);
  await page.getByRole('link', { name: /\/verify#token=/ }).click();
  await expectSoundPage(page);
  await page.getByLabel('Password').fill('not this one, surely');
  await page.getByRole('button', { name: 'Finish the account' }).click();
  await expect(page.getByRole('alert')).toContainText('not the password chosen');
  await page.getByLabel('Password').fill('twelve or more');
  await page.getByRole('button', { name: 'Finish the account' }).click();
  await expect(page).toHaveURL(/\/fit/);
  await expect(page.getByRole('button', { name: 'Sign out' })).toBeVisible();

  await page.goto('/account');
  await expectSoundPage(page);
  await page.getByLabel('Name').fill('Renamed');
  await page.getByRole('button', { name: 'Keep the name' }).click();
  await expect(page.getByRole('link', { name: 'Your account, Renamed' })).toBeVisible();
  await page.getByLabel('Password', { exact: true }).fill('twelve or more');
  await page.getByRole('button', { name: 'Set it up' }).click();
  const key = (await page.getByText(/^([A-Z2-7]{4} ){7}[A-Z2-7]{4}$/).textContent())!.replaceAll(' ', '');
  await page.getByLabel('Code').fill(oneTimeCode(key));
  await page.getByRole('button', { name: 'Turn it on' }).click();
  await expect(page.getByRole('heading', { name: /recovery codes/ })).toBeFocused();
  await expectSoundPage(page);
  await page.getByRole('button', { name: 'I have written them down' }).click();
  await expect(page.getByText('10 recovery codes are left')).toBeVisible();

  await page.getByRole('button', { name: 'Sign out' }).click();
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill('twelve or more');
  await page.getByRole('main').getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByLabel('Code')).toBeFocused();
  await expectSoundPage(page);
  await page.getByLabel('Code').fill(oneTimeCode(key, 1));
  await page.getByRole('main').getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('button', { name: 'Sign out' })).toBeVisible();

  await page.goto('/account');
  await page.getByRole('button', { name: 'Delete my account' }).click();
  const leaving = page.getByRole('region', { name: 'Delete the account' });
  await leaving.getByLabel('Password').fill('twelve or more');
  await leaving.getByRole('button', { name: 'Delete my account' }).click();
  await expect(page.getByRole('banner').getByRole('link', { name: 'Sign in' })).toBeVisible();
  expect(complaints).toEqual([]);
});

test('a lost password is replaced by the mail’s link, which works once', async ({ page }, { project }) => {
  // The size decides whose password it is; the other journeys need the demo passwords as they are.
  const email = address('forgetful', project.name);
  const made = await page.request.post('/api/v1/accounts', { data: { email, password: 'the first of them', name: 'Forgetful' } });
  const { outbox } = (await made.json()) as { outbox: string };
  const { data } = (await (await page.request.get(`/api/v1${outbox}`)).json()) as { data: { text: string }[] };
  const token = /#token=([\w-]+)/.exec(data[0]!.text)![1]!;
  await page.request.post('/api/v1/accounts/verify', { data: { token, password: 'the first of them' } });
  await page.request.delete('/api/v1/session');

  await page.goto('/sign-in');
  await page.getByRole('link', { name: 'Choose a new one' }).click();
  await expectSoundPage(page);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByRole('button', { name: 'Send me a link' }).click();
  await page.getByRole('link', { name: 'Read the mail' }).click();
  const link = page.getByRole('link', { name: /\/reset#token=/ });
  const used = await link.getAttribute('href');
  await link.click();
  await page.getByLabel('New password').fill('the second of them');
  await page.getByRole('button', { name: 'Set the new password' }).click();
  await expect(page.getByText('The new password holds.')).toBeVisible();
  await page.getByRole('link', { name: 'Sign in', exact: true }).last().click();
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill('the second of them');
  await page.getByRole('main').getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('button', { name: 'Sign out' })).toBeVisible();

  await page.goto(used!);
  await page.getByLabel('New password').fill('a third one, then');
  await page.getByRole('button', { name: 'Set the new password' }).click();
  await expect(page.getByRole('alert')).toContainText('expired or was used');
});

test('an admin invites a steward, who accepts; disables the account; and reads what happened', async ({ page, browser }, { project }) => {
  test.slow();
  const complaints = complaintsOf(page);
  const email = address('keeper', project.name);
  await signIn(page, 'admin');
  await page.goto('/admin/invitations');
  await expectSoundPage(page);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByRole('button', { name: 'Invite' }).click();
  await expect(page.getByText(`An invitation is on its way to ${email}.`)).toBeVisible();

  await page.goto('/admin/mail');
  await expectSoundPage(page);
  await page
    .getByRole('row', { name: new RegExp(email) })
    .getByRole('link')
    .first()
    .click();
  await expectSoundPage(page);
  const offer = await page.getByRole('link', { name: /\/invitation#token=/ }).getAttribute('href');
  const guest = await (await browser.newContext({ viewport: page.viewportSize() })).newPage();
  await guest.goto(offer!);
  await expect(guest.getByText(/You are invited as steward/)).toBeVisible();
  await expectSoundPage(guest);
  await guest.getByLabel('Name').fill(`Keeper ${project.name}`);
  await guest.getByLabel('Password').fill('twelve or more');
  await guest.getByRole('button', { name: 'Accept and sign in' }).click();
  await expect(guest.getByRole('link', { name: 'Tables' })).toBeVisible();

  await page.goto('/admin');
  await page.getByLabel('Name or address').fill(`keeper-${project.name}`);
  await expect(page.getByRole('link', { name: 'Demo customer' })).toHaveCount(0);
  await expectSoundPage(page);
  await page.getByRole('link', { name: `Keeper ${project.name}` }).click();
  await expect(page.getByText(/^since/).first()).toBeVisible();
  await expectSoundPage(page);
  await page.getByRole('button', { name: 'Disable the account' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Disable', exact: true }).click();
  await expect(page.getByText('This account is disabled.')).toBeVisible();
  await guest.goto('/steward');
  await expect(guest.getByRole('main').getByRole('link', { name: 'Sign in' })).toBeVisible();

  await page.goto('/admin/audit?action=account');
  await expect(page.getByText('account.disable').first()).toBeVisible();
  await expectSoundPage(page);
  const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('link', { name: /as a table/ }).click()]);
  expect(download.suggestedFilename()).toBe('audit.csv');
  await page.goto('/admin/health');
  await expect(page.getByText('Nothing needs you.')).toBeVisible();
  await expectSoundPage(page);
  await page.goto('/admin/limits');
  await expect(page.getByRole('heading', { name: 'Programs with an API key' })).toBeVisible();
  await expectSoundPage(page);
  expect(complaints).toEqual([]);
});

test('the admin’s pages say why, to those who may not see them', async ({ page }) => {
  await page.goto('/admin');
  await expect(page.getByText('You need an account to run the site.')).toBeVisible();
  await signIn(page, 'steward');
  await page.goto('/admin/health');
  await expect(page.getByText(/Only an admin may run the site/)).toBeVisible();
  for (const at of ['/verify', '/invitation', '/outbox']) {
    await page.goto(at);
    await expect(page.getByText('This link is not whole.')).toBeVisible();
    await expectSoundPage(page);
  }
});
